import { SHEETS } from './sheets';
import { workspaceKey } from './workspace-keys';

const press = (key: string, held: readonly ('ctrl' | 'meta' | 'shift' | 'alt')[] = []) =>
  workspaceKey({ key, ctrlKey: held.includes('ctrl'), metaKey: held.includes('meta'), shiftKey: held.includes('shift'), altKey: held.includes('alt') });

describe('workspaceKey', () => {
  it('opens sheets by their number in the rail', () => {
    expect(press('1')).toEqual({ kind: 'sheet', sheet: 'requirement' });
    expect(press('7')).toEqual({ kind: 'sheet', sheet: 'band' });
    expect(press(String(SHEETS.length))).toEqual({ kind: 'sheet', sheet: 'revisions' });
    expect(press('0')).toBeNull();
  });

  it('undoes and redoes with either key of the platforms', () => {
    expect(press('z', ['ctrl'])).toEqual({ kind: 'undo' });
    expect(press('Z', ['meta', 'shift'])).toEqual({ kind: 'redo' });
    expect(press('y', ['ctrl'])).toEqual({ kind: 'redo' });
  });

  it('leaves the keys of the browser alone', () => {
    expect([press('1', ['ctrl']), press('1', ['alt']), press('z'), press('a', ['ctrl'])]).toEqual([null, null, null, null]);
  });
});
