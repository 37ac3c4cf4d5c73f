import { type ExportTable } from '@/server/exports/export-column';

/** Tables as one JSON object: for each its columns with their meaning, and its rows as lists in their order. */
export async function* writeJson(tables: readonly ExportTable[], exportedAt: Date): AsyncGenerator<string> {
  yield `{"exportedAt":${JSON.stringify(exportedAt)},"tables":{`;
  for (const [index, table] of tables.entries()) {
    const columns = table.columns.map(({ header, kind, meaning }) => ({ header, kind, meaning }));
    yield `${index === 0 ? '' : ','}\n${JSON.stringify(table.name)}:{"columns":${JSON.stringify(columns)},"rows":[`;
    let separator = '';
    for await (const rows of table.pages()) {
      for (const row of rows) {
        yield `${separator}\n${JSON.stringify(row)}`;
        separator = ',';
      }
    }
    yield ']}';
  }
  yield '\n}}\n';
}
