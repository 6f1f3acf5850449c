import type { ChangeSpec, Extension } from "@codemirror/state";
import { EditorState } from "@codemirror/state";
import { EditorView } from "@codemirror/view";

/** Line breaks become blanks; those around a text that is pasted fall away. */
export const oneLine: Extension = [
  EditorView.clipboardInputFilter.of((text) => joined(text.replace(/^[\r\n]+|[\r\n]+$/g, ""))),
  EditorState.transactionFilter.of((transaction) => {
    if (transaction.newDoc.lines === 1) return transaction;
    const changes: ChangeSpec[] = [];
    transaction.changes.iterChanges((from, to, _from, _to, inserted) => {
      changes.push({ from, to, insert: joined(inserted.toString()) });
    });
    return [{ changes, userEvent: "input", scrollIntoView: true }];
  }),
];

function joined(text: string): string {
  return text.replace(/[ \t]*[\r\n]+[ \t]*|\t/g, " ");
}
