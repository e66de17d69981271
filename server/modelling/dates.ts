export const MONTH_NAMES: readonly string[] = [
  'January',
  'February',
  'March',
  'April',
  'May',
  'June',
  'July',
  'August',
  'September',
  'October',
  'November',
  'December',
]

/** 20 January. */
export function dayText({ month, day }: { readonly month: number; readonly day: number }): string {
  return `${day} ${MONTH_NAMES[month - 1]}`
}

/** March; March and April; March, April and May; of months in a row their first and last: March to June. */
export function monthsText(months: readonly number[]): string {
  if (months.length === 12) return 'all year'
  const first = months.find((month) => !months.includes(month === 1 ? 12 : month - 1))
  if (months.length > 3 && first !== undefined) {
    const row = [first]
    while (months.includes((row.at(-1)! % 12) + 1)) row.push((row.at(-1)! % 12) + 1)
    if (row.length === months.length) return `${MONTH_NAMES[first - 1]} to ${MONTH_NAMES[row.at(-1)! - 1]}`
  }
  return listText(months.map((month) => MONTH_NAMES[month - 1]))
}

/** a; a and b; a, b and c. */
export function listText(words: readonly string[]): string {
  return words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`
}

/** 1 day, 1,200 days. */
export function plural(count: number, word: string): string {
  return `${String(count).replace(/\B(?=(\d{3})+(?!\d))/g, ',')} ${word}${count === 1 ? '' : 's'}`
}
