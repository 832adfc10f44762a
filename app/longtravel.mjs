#!/usr/bin/env node
// Starts the command line on a Node that runs TypeScript as it stands. The machine's own Node may be older: `npm ci` puts
// a newer one into node_modules/node, and that one is found from this file, wherever the command was called from.
import { spawn } from 'node:child_process'
import { existsSync, readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'

const LEAST_NODE = 24
const EXIT_INPUT = 2

if (Number.parseInt(process.versions.node, 10) >= LEAST_NODE) {
  const { start } = await import('./cli.ts')
  await start()
} else {
  const node = installedNode()
  if (node === undefined) {
    const project = dirname(dirname(fileURLToPath(import.meta.url)))
    process.stderr.write(
      `longtravel: needs Node ${LEAST_NODE} or newer and this is ${process.versions.node}: run "npm ci" in ${project}\n`,
    )
    process.exitCode = EXIT_INPUT
  } else {
    hand(node)
  }
}

/** The Node of the development dependency, or undefined where it is not installed. */
function installedNode() {
  try {
    const manifest = createRequire(import.meta.url).resolve('node/package.json')
    const { bin } = JSON.parse(readFileSync(manifest, 'utf8'))
    const path = join(dirname(manifest), typeof bin === 'string' ? bin : bin.node)
    return [path, `${path}.exe`].find((candidate) => existsSync(candidate))
  } catch {
    return undefined
  }
}

/** Runs the command on another Node: arguments, streams, signals and exit code go through unchanged. */
function hand(node) {
  const cli = fileURLToPath(new URL('cli.ts', import.meta.url))
  const child = spawn(node, [cli, ...process.argv.slice(2)], { stdio: 'inherit' })
  const signals = ['SIGINT', 'SIGTERM', 'SIGHUP']
  const pass = (signal) => child.kill(signal)
  for (const signal of signals) process.on(signal, pass)
  child.on('error', (error) => {
    process.stderr.write(`longtravel: cannot start ${node}: ${error.message}\n`)
    process.exitCode = EXIT_INPUT
  })
  child.on('exit', (code, signal) => {
    for (const name of signals) process.off(name, pass)
    if (signal === null) process.exitCode = code ?? EXIT_INPUT
    else process.kill(process.pid, signal)
  })
}
