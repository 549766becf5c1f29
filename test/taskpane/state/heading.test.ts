import { describe, expect, test } from '@jest/globals';
import { headingText, parseHeading } from '../../../taskpane/state/heading.ts';

describe('a header cell', () => {
  test.each([
    ['time / h', 'time', 'h'],
    ['C / (mg/L)', 'C', 'mg/L'],
    ['p/bar', 'p', 'bar'],
    ['T (°C)', 'T', '°C'],
    ['v (m/s)', 'v', 'm/s'],
    ['flow [L/s]', 'flow', 'L/s'],
    ['flow, L/s', 'flow', 'L/s'],
    ['u(C) / (mg/L)', 'u(C)', 'mg/L'],
    ['depth', 'depth', ''],
    ['  hours \n run ', 'hours run', ''],
    ['clearance, after overhaul', 'clearance, after overhaul', ''],
  ])('%j is %s in %s', (text, name, unit) => {
    expect(parseHeading(text)).toEqual({ name, unit });
  });

  test('blank or a whole sentence is none', () => {
    expect(parseHeading('  ')).toBeUndefined();
    expect(parseHeading('Wanted by the plant manager: how fast does free chlorine fall?')).toBeUndefined();
  });

  test('an axis shows it again, the unit in brackets where it is more than a word', () => {
    expect(headingText({ name: 'time', unit: 'h' })).toBe('time / h');
    expect(headingText({ name: 'C', unit: 'mg/L' })).toBe('C / (mg/L)');
    expect(headingText({ name: 'depth', unit: '' })).toBe('depth');
  });
});
