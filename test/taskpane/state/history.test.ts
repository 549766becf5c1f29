import { expect, test } from '@jest/globals';
import { advance, mapHistory, redo, startHistory, undo } from '../../../taskpane/state/history.ts';

test('steps are taken back and done again, each with its name', () => {
  const after = advance(advance(startHistory('a'), 'b', 'write b'), 'c', 'write c');
  const back = undo(after);
  expect([back.present, back.future[0]?.what]).toEqual(['b', 'write c']);
  expect(undo(back).present).toBe('a');
  expect(redo(back)).toEqual({ ...after, mark: '' });
});

test('a new step forgets what was taken back', () => {
  const forked = advance(undo(advance(startHistory('a'), 'b', 'b')), 'c', 'c');
  expect(forked.future).toEqual([]);
  expect(redo(forked)).toBe(forked);
});

test('steps with one mark, one after the other, are one step', () => {
  const typed = advance(advance(startHistory('a'), 'b', 'type', 'field'), 'c', 'type', 'field');
  expect(undo(typed).present).toBe('a');
  const parted = advance(advance(typed, 'd', 'else'), 'e', 'type', 'field');
  expect(undo(parted).present).toBe('d');
});

test('there is nothing before the start and after the end', () => {
  const start = startHistory('a');
  expect(undo(start)).toBe(start);
  expect(redo(start)).toBe(start);
});

test('what all states stand on can change under them', () => {
  const history = mapHistory(
    undo(advance(advance(startHistory('a'), 'b', 'b'), 'c', 'c')),
    (state) => `${state}!`,
  );
  expect([undo(history).present, history.present, redo(history).present]).toEqual(['a!', 'b!', 'c!']);
});
