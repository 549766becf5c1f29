import { describe, expect, test } from '@jest/globals';
import { fillTemplate } from '../../manifest-template/fillTemplate.ts';

describe('fillTemplate', () => {
  test('escapes text and leaves markup alone', () => {
    const filled = fillTemplate('<p title="{{tip}}">{{{body}}}</p>', {
      tip: `"a" < 'b' & c`,
      body: '<b>x</b>',
    });
    expect(filled).toBe('<p title="&quot;a&quot; &lt; &#39;b&#39; &amp; c"><b>x</b></p>');
  });

  test('a value is never filled twice', () => {
    expect(fillTemplate('{{a}}{{b}}', { a: '{{b}}', b: '$&' })).toBe('{{b}}$&amp;');
  });

  test('refuses a name that is not given, also an inherited one', () => {
    expect(() => fillTemplate('{{gone}}', {})).toThrow('asks for {{gone}}');
    expect(() => fillTemplate('{{toString}}', {})).toThrow('asks for {{toString}}');
  });

  test('refuses a value without a place', () => {
    expect(() => fillTemplate('{{a}}', { a: '1', b: '2' })).toThrow('no place for {{b}}');
  });
});
