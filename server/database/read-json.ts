/**
 * Reads a JSON column. MariaDB keeps JSON as text; the driver parses it when the server says that
 * the column is JSON, but not for expressions and views, which arrive as text.
 *
 * A column that holds a JSON *string* must not be read with this.
 */
export function readJson(value: unknown): unknown {
  return typeof value === 'string' ? (JSON.parse(value) as unknown) : value;
}
