// Counts the tests of vitest's report: node count.mjs REPORT STATUS, where STATUS is what the test command ended with.
// A step that failed outside a counted test (install, format, lint, a file that does not load) is one failure, and so is
// a run without any test.
import { readFileSync } from 'node:fs'

const [report, status] = process.argv.slice(2)
const { numPassedTests: passed, numFailedTests } = read(report)
const broken = status !== '0' || passed === 0
const failed = numFailedTests === 0 && broken ? 1 : numFailedTests
process.stdout.write(`${passed} passed, ${failed} failed\n`)
process.exitCode = failed === 0 ? 0 : 1

/** A report that is not there: no test ran. */
function read(path) {
  try {
    return JSON.parse(readFileSync(path, 'utf8'))
  } catch {
    return { numPassedTests: 0, numFailedTests: 0 }
  }
}
