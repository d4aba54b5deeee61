// A mapping guessed from the table itself.

import { plainCharacters } from '#engine';
import { guessedSeparator, readCsv, separators } from './csv.ts';
import { decoded, guessedEncoding } from './encoding.ts';
import { fieldNamed, notTaken } from './fields.ts';
import { readHeader } from './headers.ts';
import type { HeaderGuess } from './headers.ts';
import type { Column, Mapping } from './mapping.ts';
import type { ColumnRemark } from './mappingText.ts';

export interface GuessedMapping {
  readonly mapping: Mapping;
  /** One for each column of the mapping. */
  readonly remarks: readonly ColumnRemark[];
}

type Rows = readonly (readonly string[])[];

const usualMissing = ['-', '–', '—', '?', 'n.d.', 'n. d.', 'n/a', 'N/A', 'n.a.', '/', 'k. A.', 'none'];

/** Guesses how a table is to be read. The table may be nonsense: then most columns are left out. */
export function guessMapping(bytes: Uint8Array): GuessedMapping {
  const encoding = guessedEncoding(bytes);
  const text = decoded(bytes, encoding) ?? '';
  const separator = guessedSeparator(text);
  const { rows } = readCsv(text, separators[separator]);
  const header = headerRow(rows);
  const body = rows.slice(header + 1).filter((row) => row.some((cell) => cell.trim() !== ''));
  const headers = rows[header] ?? [];
  const cells = (index: number): string[] => body.flatMap((row) => { const cell = row[index]?.trim() ?? ''; return cell === '' ? [] : [cell]; });
  const guesses = headers.map((one) => readHeader(one.trim()));
  const missing = usualMissing.filter((mark) => body.some((row) => row.some((cell) => cell.trim() === mark)));
  const decimal = guessedDecimal(guesses, cells, missing, separator === 'semicolon');
  const positions = guesses.filter(({ field }) => field === 'position').length;
  const perComplex = positions > 1;
  const columns = headers.map((typed, index): Column & { readonly sized: boolean } => {
    const guess = guesses[index]!;
    const field = guess.field === 'band.notes' && perComplex && guess.number === null ? 'measurement.notes' : (guess.field ?? notTaken);
    const known = field === notTaken ? null : fieldNamed(field);
    const sized = guess.unit === null && known?.kind === 'energy' && cells(index).some(isBareNumber) ? unitBySize(cells(index)) : null;
    const bySize = sized ?? (guess.unit === null && field === 'temperature' && cells(index).some(isBareNumber) ? 'K' : null);
    return { index, header: typed.trim(), field, unit: guess.unit ?? bySize, number: guess.number, term: guess.term, brackets: guess.brackets, sized: bySize !== null };
  });
  const counted = perComplex ? numberedColumns(columns) : columns.map((column) => ({ ...column, number: null }));
  const single = withoutRivals(counted);
  const keys = columns.filter(({ field }) => field === 'id' || field === 'formula').map(({ index }) => index);
  const continued = !perComplex && keys.length > 0 && body.some((row) => keys.every((index) => (row[index]?.trim() ?? '') === '')) ? 'blank' : 'repeated';
  return {
    mapping: { confirmed: false, rows: perComplex ? 'complex' : 'band', separator, decimal, encoding, header: header + 1, continued, missing, columns: single.map(({ sized: _, ...column }) => column), everyRow: {} },
    remarks: single.map((column) => ({ remark: remarkOf(column, cells(column.index)) })),
  };
}

/** The first row with the most columns that are understood, among the first twenty. */
function headerRow(rows: Rows): number {
  const understood = rows.slice(0, 20).map((row) => new Set(row.flatMap((cell) => (cell.trim() === '' ? [] : (readHeader(cell.trim()).field ?? [])))).size);
  const most = Math.max(0, ...understood);
  return most === 0 ? 0 : understood.indexOf(most);
}

function isBareNumber(cell: string): boolean {
  return /\d/.test(cell) && !/[a-z]/i.test(plainCharacters(cell).replace(/\bsh\b|\([^)]*\)/gi, ''));
}

function guessedDecimal(guesses: readonly HeaderGuess[], cells: (index: number) => string[], missing: readonly string[], semicolon: boolean): Mapping['decimal'] {
  const numbers = guesses.flatMap(({ field }, index) => (field === null || ['text', 'term', 'ligands', 'hazards', 'ion', 'geometry', 'spin'].includes(fieldNamed(field).kind) ? [] : cells(index))).filter((cell) => !missing.includes(cell));
  const surelyComma = numbers.some((cell) => /\d,\d{1,2}(?!\d)|\d,\d{4,}|\d\.\d{3},\d/.test(cell));
  const surelyPoint = numbers.some((cell) => /\d\.\d{1,2}(?!\d)|\d\.\d{4,}|\d,\d{3}\.\d/.test(cell));
  if (surelyComma !== surelyPoint) return surelyComma ? 'comma' : 'point';
  return semicolon && numbers.some((cell) => cell.includes(',')) && !numbers.some((cell) => cell.includes('.')) ? 'comma' : 'point';
}

/** A unit for energies that carry none, by the size of most of them; the person confirms it. */
function unitBySize(cells: readonly string[]): string | null {
  const sizes = cells.filter(isBareNumber).map((cell) => Number.parseFloat(plainCharacters(cell).replace(/(\d) (?=\d{3})/g, '$1').replace(',', '.'))).filter(Number.isFinite).sort((a, b) => a - b);
  const middle = sizes[Math.floor(sizes.length / 2)];
  if (middle === undefined) return null;
  return middle >= 2000 ? 'cm-1' : middle >= 100 ? 'nm' : middle >= 5 ? 'kK' : 'eV';
}

/** Positions side by side are counted where their headers do not count them; what belongs to a band follows it. */
function numberedColumns<T extends Column>(columns: readonly T[]): T[] {
  let next = 0;
  return columns.map((column) => {
    if (column.field === notTaken || !['band', 'quoted'].includes(fieldNamed(column.field).level)) return { ...column, number: null };
    if (fieldNamed(column.field).level === 'quoted') return column;
    if (column.field === 'position') next = column.number ?? next + 1;
    return { ...column, number: column.number ?? Math.max(next, 1) };
  });
}

/** Where two columns claim one field the first has it. */
function withoutRivals<T extends Column>(columns: readonly T[]): T[] {
  const taken = new Set<string>();
  return columns.map((column) => {
    const claim = `${column.field} ${column.number ?? ''}`;
    if (column.field === notTaken) return column;
    if (taken.has(claim)) return { ...column, field: notTaken, unit: null, number: null, term: null };
    taken.add(claim);
    return column;
  });
}

function remarkOf(column: Column & { readonly sized: boolean }, cells: readonly string[]): string {
  const examples = [...new Set(cells)].slice(0, 2).map((cell) => cell.replace(/\s+/g, ' ').slice(0, 30)).join(' | ');
  const said = examples === '' ? 'empty' : `e.g. ${examples}`;
  return column.sized ? `${said}; the unit is guessed from the size of the numbers` : said;
}
