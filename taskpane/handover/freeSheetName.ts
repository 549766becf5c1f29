/** A name for a new sheet: as wanted or, where a sheet has it already, with the next number. */
export async function freeSheetName(context: Excel.RequestContext, wanted: string): Promise<string> {
  const { worksheets } = context.workbook;
  worksheets.load('items/name');
  await context.sync();
  const taken = new Set(worksheets.items.map(({ name }) => name.toLowerCase()));
  if (!taken.has(wanted.toLowerCase())) return wanted;
  for (let number = 2; ; number++) {
    const name = `${wanted} ${number}`;
    if (!taken.has(name.toLowerCase())) return name;
  }
}
