import { complain, say } from './notices.ts';

/** The little of the clipboard that is used; absent where the page is not served safely. */
export interface ClipboardHost {
  readonly writeText?: (text: string) => Promise<void>;
  readonly readText?: () => Promise<string>;
}

/** This browser's clipboard. */
export function browserClipboard(): ClipboardHost {
  const clipboard = navigator.clipboard as Clipboard | undefined;
  return {
    ...(clipboard?.writeText && { writeText: (text: string) => clipboard.writeText(text) }),
    ...(clipboard?.readText && { readText: () => clipboard.readText() }),
  };
}

/** Copies `text` and says that `what` is copied; when the browser refuses, says so and shows the text to copy by hand. */
export async function copyText(host: ClipboardHost, text: string, what: string): Promise<boolean> {
  try {
    if (!host.writeText) throw new Error('no clipboard');
    await host.writeText(text);
    say(`${what} copied.`);
    return true;
  } catch {
    complain('The browser did not allow copying: select the text in the box and copy it by hand.', {
      box: { kind: 'copy', text },
    });
    return false;
  }
}

/** Gives the clipboard's text to `take`; when the browser refuses, says so and offers a box to paste into by hand. */
export async function pasteText(host: ClipboardHost, take: (text: string) => void): Promise<void> {
  let text: string;
  try {
    if (!host.readText) throw new Error('no clipboard');
    text = await host.readText();
  } catch {
    complain('The browser did not allow reading the clipboard: paste into the box instead.', {
      box: { kind: 'paste', take },
    });
    return;
  }
  take(text);
}
