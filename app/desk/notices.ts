import { createStore } from 'zustand/vanilla';

/** Something to do about what a notice says. */
export interface NoticeAction {
  readonly label: string;
  readonly run: () => void;
}

/** What stands in when the clipboard is refused: a text to copy by hand, or a place to paste into by hand. */
export type NoticeBox =
  | { readonly kind: 'copy'; readonly text: string }
  | { readonly kind: 'paste'; readonly take: (text: string) => void };

/** One thing said to the user. The newest takes the place of the one before. */
export interface Notice {
  readonly id: number;
  readonly text: string;
  /** An error: spoken at once, and it stays until it is dismissed. */
  readonly urgent: boolean;
  readonly action: NoticeAction | null;
  readonly box: NoticeBox | null;
}

export const noticeStore = createStore<{ readonly notice: Notice | null }>(() => ({ notice: null }));

let count = 0;

function put(notice: Omit<Notice, 'id'>): void {
  count += 1;
  noticeStore.setState({ notice: { ...notice, id: count } });
}

/** Says something that went well. */
export const say = (text: string, action: NoticeAction | null = null): void =>
  put({ text, urgent: false, action, box: null });

/** Says what went wrong, with what stands in for it. */
export const complain = (
  text: string,
  instead: { readonly action?: NoticeAction; readonly box?: NoticeBox } = {},
): void => put({ text, urgent: true, action: instead.action ?? null, box: instead.box ?? null });

/** Takes the notice off the screen; with an id only when it is still that one. */
export function dismissNotice(id?: number): void {
  const { notice } = noticeStore.getState();
  if (notice && (id === undefined || notice.id === id)) noticeStore.setState({ notice: null });
}
