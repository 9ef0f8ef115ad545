import { describe, expect, it } from 'vitest';
import { JsonElements } from './json-elements';

/** Splits a text that arrives in pieces of a given length. */
function split(text: string, length: number): { isArray: boolean; elements: string[] } {
  const splitter = new JsonElements();
  const elements: string[] = [];
  for (let i = 0; i < text.length; i += length) {
    elements.push(...splitter.push(text.slice(i, i + length)));
  }
  elements.push(...splitter.end());
  return { isArray: splitter.isArray, elements };
}

describe('elements of a JSON text that arrives in pieces', () => {
  const values = [{ a: '],}"\\' }, [1, [2]], 'text, "quoted"', 3, null, { b: { c: [] } }];

  it.each([1, 2, 3, 7, 1000])('splits an array that arrives %i characters at a time', (length) => {
    for (const text of [JSON.stringify(values), ` ${JSON.stringify(values, null, 2)}\n`]) {
      const { isArray, elements } = split(text, length);
      expect(isArray).toBe(true);
      expect(elements.map((element) => JSON.parse(element) as unknown)).toEqual(values);
    }
  });

  it.each([1, 3, 1000])('splits NDJSON that arrives %i characters at a time', (length) => {
    const objects = values.filter((value) => !Array.isArray(value));
    const text = objects.map((value) => JSON.stringify(value)).join('\n');
    for (const ending of ['', '\n', '\r\n \n']) {
      const { isArray, elements } = split(text + ending, length);
      expect(isArray).toBe(false);
      expect(elements.map((element) => JSON.parse(element) as unknown)).toEqual(objects);
    }
  });

  it('takes one value on several lines for one value', () => {
    const { elements } = split(JSON.stringify({ a: [1, 2], b: {} }, null, 2), 5);
    expect(elements).toHaveLength(1);
  });

  it('knows an empty array', () => {
    expect(split(' [ ] ', 1)).toEqual({ isArray: true, elements: [] });
  });

  it.each(['', '  ', '[', '[1', '[1,2', '[1] 2', '[1]]'])('refuses %j', (text) => {
    expect(() => split(text, 1)).toThrow(SyntaxError);
  });

  it.each(['[,1]', '[1,]', '[1,,2]', '{"a":1}}', '[}]', '{"a"'])(
    'leaves an element that is no JSON in %j',
    (text) => {
      expect(() =>
        split(text, 1).elements.map((element) => JSON.parse(element) as unknown),
      ).toThrow(SyntaxError);
    },
  );
});
