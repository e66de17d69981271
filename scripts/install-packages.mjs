// Plain Node: it runs before any package is there.
import { spawnSync } from 'node:child_process'
import { existsSync, readFileSync, writeFileSync } from 'node:fs'
import { createHash } from 'node:crypto'
import { fileURLToPath } from 'node:url'
import path from 'node:path'

export const root = path.dirname(path.dirname(fileURLToPath(import.meta.url)))

/** Installs the locked packages when they are missing or the lock file has changed since. */
export function installPackages() {
  const lock = createHash('sha256')
    .update(readFileSync(path.join(root, 'package-lock.json')))
    .digest('hex')
  const stamp = path.join(root, 'node_modules', '.loamkeep-lock')
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return
  process.stderr.write('Installing packages from the lock file …\n')
  const done = spawnSync('npm', ['ci', '--no-fund', '--no-audit'], {
    cwd: root,
    stdio: ['ignore', process.stderr, process.stderr],
    shell: process.platform === 'win32',
  })
  if (done.status !== 0) {
    process.stderr.write('npm ci did not succeed; see its messages above.\n')
    process.exit(done.status ?? 1)
  }
  writeFileSync(stamp, lock)
}
