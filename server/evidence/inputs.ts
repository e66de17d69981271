import { existsSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { fileURLToPath } from 'node:url'
import { gunzipSync } from 'node:zlib'
import { parse } from 'csv-parse/sync'
import type { EvidenceInputs } from './check.ts'

const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), '../..')
const sharedFolder = path.join(root, '..', 'shared')

/** The project's own published rows and data, and the shared folder beside it where there is one. */
export const evidenceInputs: EvidenceInputs = {
  published: (file) =>
    parse(readFileSync(path.join(root, 'data/published', file), 'utf8'), {
      columns: true,
      comment: '#',
      comment_no_infix: true,
      trim: true,
      skip_empty_lines: true,
    }),
  data: (file) => readFileSync(path.join(root, 'data', file), 'utf8'),
  shared: (file) => {
    const whole = path.join(sharedFolder, file)
    if (!existsSync(whole)) return null
    const bytes = readFileSync(whole)
    return (whole.endsWith('.gz') ? gunzipSync(bytes) : bytes).toString('utf8')
  },
}
