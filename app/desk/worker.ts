/** The worker thread that the desk is: the record is opened here and nowhere else. */
import { parentPort, workerData } from 'node:worker_threads'
import { serve } from './serve.ts'
import { makeSheet } from './sheet.ts'

if (parentPort === null) throw new Error('worker.ts runs as a worker thread only')
const { home } = workerData as { readonly home: string }
serve(parentPort, home, makeSheet)
