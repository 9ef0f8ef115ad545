import { importErrorsCsv } from './import-errors-csv';

describe('errors of a dry run as CSV', () => {
  it('quotes what needs it', () => {
    const csv = importErrorsCsv([
      { row: 7, column: 'power', given: '5, or 6', message: 'Say "W" or "mW".', allowed: 'mW, W' },
    ]);
    expect(csv).toBe(
      'row,column,given,message,allowed\r\n7,power,"5, or 6","Say ""W"" or ""mW"".","mW, W"\r\n',
    );
  });

  it.each(['=1+1', '+5', '-5', '@sum', '\tx'])('makes %j a text, not a formula', (given) => {
    const [, row] = importErrorsCsv([{ row: 2, column: 'c', given, message: 'm' }]).split('\r\n');
    expect(row).toContain(`,'${given}`);
  });
});
