import { beforeEach, describe, expect, test } from 'vitest';
import { copyText, pasteText } from '../../../app/desk/clipboard.ts';
import { dismissNotice, noticeStore } from '../../../app/desk/notices.ts';
import { failure } from './fakes.ts';

const notice = () => noticeStore.getState().notice;
const refuse = async (): Promise<never> => {
  throw failure('NotAllowedError');
};

describe('the clipboard', () => {
  beforeEach(() => dismissNotice());

  test('says what is copied', async () => {
    const copied: string[] = [];
    const host = {
      writeText: async (text: string) => {
        copied.push(text);
      },
    };
    expect(await copyText(host, 'a\tb', 'The spacing table is')).toBe(true);
    expect(copied).toEqual(['a\tb']);
    expect(notice()).toMatchObject({ text: 'The spacing table is copied.', urgent: false });
  });

  test.each([
    ['refused', { writeText: refuse }],
    ['absent', {}],
  ])(
    'when copying is %s, one sentence says so and the text stands there to be copied by hand',
    async (_, host) => {
      expect(await copyText(host, 'a\tb', 'The spacing table is')).toBe(false);
      expect(notice()).toMatchObject({
        text: 'The browser did not allow copying: select the text in the box and copy it by hand.',
        urgent: true,
        box: { kind: 'copy', text: 'a\tb' },
      });
    },
  );

  test('gives what is pasted', async () => {
    const taken: string[] = [];
    await pasteText({ readText: async () => 'parts' }, (text) => taken.push(text));
    expect(taken).toEqual(['parts']);
    expect(notice()).toBeNull();
  });

  test.each([
    ['refused', { readText: refuse }],
    ['absent', {}],
  ])('when pasting is %s, one sentence says so and a box takes the text by hand', async (_, host) => {
    const taken: string[] = [];
    await pasteText(host, (text) => taken.push(text));
    const box = notice()?.box;
    expect(notice()?.text).toBe(
      'The browser did not allow reading the clipboard: paste into the box instead.',
    );
    if (box?.kind === 'paste') box.take('by hand');
    expect(taken).toEqual(['by hand']);
  });
});
