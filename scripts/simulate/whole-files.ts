import { open, rename, rm, stat } from 'node:fs/promises'
import path from 'node:path'
import { UsageError } from './arguments.ts'

interface WholeFile {
  readonly path: string
  readonly parts: Iterable<string>
}

/** Refuses, before any work is done, targets that could not be written afterwards. */
export async function checkTargets(paths: readonly string[]): Promise<void> {
  for (const target of paths) {
    const folder = path.dirname(target)
    const facts = await stat(folder).catch(() => null)
    if (!facts?.isDirectory()) throw new UsageError(`${target}: there is no folder ${folder}.`)
    const old = await stat(target).catch(() => null)
    if (old && !old.isFile()) throw new UsageError(`${target}: is not a file that could be written.`)
  }
}

/** Writes all files or none: each beside its place first, then all are put there. */
export async function writeWhole(files: readonly WholeFile[]): Promise<void> {
  const made: string[] = []
  try {
    for (const file of files) {
      const beside = `${file.path}.${process.pid}.part`
      const handle = await open(beside, 'wx').catch((error: NodeJS.ErrnoException) => {
        throw new UsageError(`${file.path}: cannot be written (${error.code}).`)
      })
      made.push(beside)
      try {
        let text = ''
        for (const part of file.parts) {
          text += part
          if (text.length < 1 << 16) continue
          await handle.appendFile(text)
          text = ''
        }
        await handle.appendFile(text)
        await handle.sync()
      } finally {
        await handle.close()
      }
    }
    for (const [k, file] of files.entries()) await rename(made[k], file.path)
  } finally {
    await Promise.all(made.map((beside) => rm(beside, { force: true })))
  }
}
