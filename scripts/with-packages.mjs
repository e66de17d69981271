// Runs a TypeScript command of this folder, installing the packages first where they are missing.
import { spawn } from 'node:child_process'
import path from 'node:path'
import { installPackages, root } from './install-packages.mjs'

installPackages()
const [script, ...args] = process.argv.slice(2)
const child = spawn(process.execPath, ['--import', 'tsx', path.join(root, script), ...args], {
  stdio: 'inherit',
})
for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal))
child.on('exit', (code, signal) => process.exit(code ?? (signal ? 1 : 0)))
