/** A column's name as the file has it, taken apart. */
export interface ColumnHeader {
  readonly tag: string;
  /** unit text in brackets behind the tag, or null */
  readonly unit: string | null;
}

/**
 * The tag and the unit of a column name: "FT-101 [m3/h]" and "FT-101 (m3/h)" are tag FT-101 in m3/h.
 *
 * A bracket that is no unit of its own, as in "Level (west)", still belongs to the unit here: a tag matches a
 * column with or without what stands in brackets behind it.
 */
export function columnHeader(name: string): ColumnHeader {
  const text = name.trim();
  const square = /^(.*\S)\s*\[([^[\]]*)\]$/.exec(text);
  // One level of brackets inside, for bar(g) and kPa(a).
  const round =
    /^(.*\S)\s+\(((?:[^()]|\([^()]*\))*)\)$/.exec(text) ??
    /^([^()]*[^\s()])\(((?:[^()]|\([^()]*\))*)\)$/.exec(text);
  const [, tag, unit] = square ?? round ?? [];
  return tag ? { tag: tag.trim(), unit: unit?.trim() || null } : { tag: text, unit: null };
}
