import { StateEffect, StateField } from "@codemirror/state";

export const setEditing = StateEffect.define<boolean>();

/** Whether what stands in the view is being typed, or only shown. */
export const editing = StateField.define<boolean>({
  create: () => false,
  update: (is, { effects }) => effects.find((each) => each.is(setEditing))?.value ?? is,
});
