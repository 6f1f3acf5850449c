import { searchFunctions } from "../../../../catalog/searchFunctions.js";
import type { Definition, Input } from "../../../../functions/definition.js";
import { areaText, cellIn } from "../areaText.js";
import { latest } from "../latest.js";
import type { Part, Surroundings } from "../part.js";
import { readSheetTable, type SheetTable } from "../sheetTable.js";
import type { Area } from "../worksheet.js";
import { type CallFields, type InputField, readField } from "./callFields.js";
import type { BuildState, FindActions, FindState } from "./findState.js";
import { findView } from "./findView.js";
import { firstTarget, ownUnit } from "./firstFields.js";
import { insertCall, occupied } from "./insertCall.js";
import { type Preview, previewCall } from "./previewCall.js";
import { pickedField, proposeInputs } from "./proposeInputs.js";
import { callOf, targetOf } from "./targetOf.js";

export function findPart(surroundings: Surroundings): Part {
  const { worksheet, redraw, announce, attempt } = surroundings;
  let state: FindState = { query: "", found: searchFunctions(""), chosen: undefined, build: undefined };
  const lastPreview = latest();
  const lastChoice = latest();

  function update(change: Partial<FindState>): void {
    state = { ...state, ...change };
    redraw();
  }

  function updateBuild(change: Partial<BuildState>): void {
    if (!state.build) return;
    update({ build: { ...state.build, warned: undefined, ...change } });
    attempt(() => lastPreview(previewCall(worksheet, state.build!.fields), showPreview));
  }

  function showPreview(preview: Preview): void {
    if (state.build) update({ build: { ...state.build, preview } });
  }

  function choose(definition: Definition): void {
    update({ chosen: definition, build: undefined });
    attempt(() =>
      lastChoice(Promise.all([readSheetTable(worksheet), worksheet.selection()]), ([table, selection]) => {
        if (state.chosen === definition) startBuild(definition, table, selection);
      }),
    );
  }

  function startBuild(definition: Definition, table: SheetTable | undefined, selection: Area): void {
    const target = firstTarget(table, selection);
    const inputs = proposeInputs(definition, table);
    const fields: CallFields = {
      definition,
      sheet: selection.sheet,
      inputs,
      result: ownUnit(definition, table, target),
    };
    const build: BuildState = {
      table,
      fields,
      target: areaText(target),
      fillsDown: true,
      writesHeader: true,
      picking: undefined,
      preview: undefined,
      warned: undefined,
    };
    update({ build });
    updateBuild({});
  }

  function selected(): void {
    const { build, chosen } = state;
    if (!build || !chosen || build.picking === undefined) return;
    const { picking } = build;
    attempt(async () => {
      const area = await worksheet.selection();
      if (state.build?.picking !== picking) return;
      const { sheet } = state.build.fields;
      if (picking === "target") {
        // The formula goes where the analyst clicks, on whichever sheet that is.
        const fields = { ...state.build.fields, sheet: area.sheet };
        updateBuild({ fields, target: areaText(cellIn(area)) });
      } else {
        // What was typed by hand is not written over by a click that may have meant something else.
        const { is } = readField(state.build.fields.inputs[picking]!.text, sheet);
        if (is === "number" || is === "text") return;
        const input = (chosen.inputs as readonly Input[])[picking]!;
        setInput(picking, pickedField(input, area, state.build.table, sheet));
      }
    });
  }

  function setInput(index: number, field: Partial<InputField>): void {
    if (!state.build) return;
    const { fields } = state.build;
    const inputs = fields.inputs.map((before, at) => (at === index ? { ...before, ...field } : before));
    updateBuild({ fields: { ...fields, inputs } });
  }

  function insert(): void {
    if (!state.build) return;
    // The cells that were filled are selected in the end; no field follows them.
    updateBuild({ picking: undefined, warned: state.build.warned });
    const { build } = state;
    attempt(async () => {
      // The cells may have changed since they were read, and with them how many columns the result fills.
      const ready = { ...build, preview: await previewCall(worksheet, build.fields) };
      const target = targetOf(ready);
      if (!target) return;
      const full = await occupied(worksheet, target);
      if (full !== undefined && build.warned !== full) return updateBuild({ warned: full });
      const filled = await insertCall(worksheet, callOf(ready), target);
      updateBuild({ warned: undefined });
      announce(`${build.fields.definition.name} is in ${filled}.`);
    });
  }

  const actions: FindActions = {
    search: (query) => update({ query, found: searchFunctions(query) }),
    choose,
    leave: () => update({ chosen: undefined, build: undefined }),
    pick: (picking) => state.build && update({ build: { ...state.build, picking } }),
    setInput,
    set: ({ result, ...change }) =>
      state.build &&
      updateBuild({ ...change, ...(result === undefined ? {} : { fields: { ...state.build.fields, result } }) }),
    insert,
  };
  return { id: "find", title: "Find", view: () => findView(state, actions), shown: () => {}, selected };
}
