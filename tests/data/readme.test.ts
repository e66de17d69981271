import { readFileSync, readdirSync } from 'node:fs'
import { expect, test } from 'vitest'

const data = new URL('../../data/', import.meta.url)
const readme = readFileSync(new URL('README.md', data), 'utf8')

test('data/README.md names every file of the folder with its origin', () => {
  const files = readdirSync(data, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && entry.name !== 'README.md')
    .map((entry) =>
      `${entry.parentPath.slice(entry.parentPath.indexOf('/data') + 6)}/${entry.name}`.replace(/^\//, ''),
    )
    .filter((file) => !file.startsWith('examples/'))
  const missing = files.filter((file) => !readme.includes(`| ${file} |`))
  expect(missing).toEqual([])
})
