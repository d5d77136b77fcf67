import { readFileSync } from 'node:fs';
import { beforeAll, describe, expect, it } from 'vitest';
import {
  beginHistory,
  canRedo,
  canUndo,
  edit,
  redo,
  undo,
  type History,
} from '../../../src/stage/history.ts';
import { readStage } from '../../../src/stage/readStage.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';
import { writeStage } from '../../../src/stage/writeStage.ts';
import { failure, success } from '../../../src/values/result.ts';

let stage: StageDocument;
beforeAll(async () => {
  const read = await readStage(readFileSync(new URL('kept/version-1.stage.json', import.meta.url), 'utf8'));
  if (!read.ok) throw new Error('refused');
  stage = read.value;
});

const setTitle = (history: History, title: string): History => {
  const edited = edit(history, 'Rename the stage', (draft) => {
    draft.title = title;
    return success(undefined);
  });
  if (!edited.ok) throw new Error(edited.faults.map(({ message }) => message).join('; '));
  return edited.value.history;
};

describe('the history of a document', () => {
  it('makes one step of one edit, undoes it to the first document and redoes it to the last', () => {
    const first = beginHistory(stage);
    const last = setTitle(setTitle(first, 'One'), 'Two');
    expect(last.past.map(({ title }) => title)).toEqual(['Rename the stage', 'Rename the stage']);
    const back = undo(undo(last));
    expect(writeStage(back.document)).toBe(writeStage(stage));
    expect(writeStage(redo(redo(back)).document)).toBe(writeStage(last.document));
  });

  it('keeps the order of keys, as a deleted part comes back where it stood', () => {
    const edited = edit(beginHistory(stage), 'Delete R1', (draft) => {
      delete draft.parts.p4;
      delete draft.wires.w4;
      delete draft.wires.w5;
      return success(undefined);
    });
    if (!edited.ok) throw new Error('refused');
    expect(Object.keys(edited.value.history.document.parts)).not.toContain('p4');
    expect(writeStage(undo(edited.value.history).document)).toBe(writeStage(stage));
  });

  it('adds no step for an edit that changes nothing', () => {
    const history = beginHistory(stage);
    expect(setTitle(history, stage.title)).toBe(history);
    expect(canUndo(history)).toBe(false);
    expect(undo(history)).toBe(history);
    expect(redo(history)).toBe(history);
  });

  it('changes nothing where an edit fails, or would leave a document that the reader refuses', () => {
    const history = beginHistory(stage);
    const failed = edit(history, 'Fail', (draft) => {
      draft.title = 'half done';
      return failure({ code: 'trial', message: 'It does not work.' });
    });
    expect(failed).toMatchObject({ ok: false, faults: [{ code: 'trial' }] });
    const refused = edit(history, 'Name two parts alike', (draft) => {
      const part = draft.parts.p4;
      if (part !== undefined) part.name = 'Q1';
      return success(undefined);
    });
    expect(refused.ok).toBe(false);
    expect(history.document).toBe(stage);
  });

  it('forgets what was undone once something else is done', () => {
    const undone = undo(setTitle(beginHistory(stage), 'One'));
    expect(canRedo(undone)).toBe(true);
    expect(canRedo(setTitle(undone, 'Other'))).toBe(false);
  });
});
