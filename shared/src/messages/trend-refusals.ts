/** Why a trend file cannot be used: what, where, and how to mend it. One function a reason, so a test can name it. */
export const trendRefusals = {
  empty: () => 'The file is empty. Export it again with the span and the tags you want.',
  notText: (line: number) =>
    `Line ${line} holds bytes that are not text, so this is not a CSV export. Export as CSV, or as a gzip of one.`,
  wideCharacters: () =>
    'The file is in UTF-16. Save it as UTF-8 (“CSV UTF-8” in most programs) and bring it in again.',
  gzipBroken: () => 'The gzip ends in the middle or is damaged. Make it again, or bring in the plain file.',
  gzipBomb: (limit: string) =>
    `The gzip unpacks to more than ${limit}, or to far more than a trend would. Split the export and bring in the parts.`,
  rowTooLong: (line: number) =>
    `Line ${line} is longer than 1 MB. A quote that is never closed does this; check the file there.`,
  headerOnly: () =>
    'The file has a header and no rows below it. Export it again with a span that holds samples.',
  noHeader: (line: number) =>
    `There is no line ${line} to hold the header. Correct the header line in the plan.`,
  notATable: () =>
    'No column of times and values could be found. The file needs one line of column names, and a time in every row below it.',
  missingColumn: (column: string, header: readonly string[]) =>
    `There is no column “${column}”. The header has: ${header.slice(0, 12).join(', ')}${header.length > 12 ? ' …' : ''}. Choose another column in the plan.`,
  sameTagTwice: (tag: string, first: number, second: number) =>
    `The tag “${tag}” stands in column ${first} and again in column ${second}. Remove one of them, or rename it.`,
  mixedDecimalMarks: (line: number, column: string, cell: string, mark: string) =>
    `Line ${line}, column “${column}”: “${cell}” is not written with the decimal mark “${mark}” of the rest. Export with one decimal mark, or correct it in the plan.`,
  timeGoesBack: (line: number, former: string, here: string) =>
    `Line ${line}: the time goes back from ${former} to ${here}. Sort the file by time, or take out what was joined twice.`,
  clockChange: (line: number, former: string, here: string, zone: string) =>
    `Line ${line}: the time goes back from ${former} to ${here}, by two hours or less. That happens when a clock change is read in the wrong zone; the plan says ${zone}. Correct the zone and take it in again.`,
  noTime: (line: number, cell: string, format: string) =>
    `No time could be read in the first rows; line ${line} has “${cell}”, and the plan expects ${format}. Correct the time column or its format.`,
  allBad: (count: number) =>
    `All ${count} values are marked bad or are not numbers. Check the quality column of the plan and the export’s span.`,
  nothingWanted: () =>
    'None of the file’s tags is bound to a valve you can see. Bind at least one tag to a valve, then take it in.',
} as const;
export type TrendRefusal = keyof typeof trendRefusals;
