import type { Preferences } from "../../page.js";
import type { Panel } from "../../panel.js";
import type { Command } from "../command.js";
import type { Shell } from "../shell.js";

const themes: readonly { readonly theme: Preferences["theme"]; readonly words: string }[] = [
  { theme: "system", words: "Light or dark as the system" },
  { theme: "light", words: "Light" },
  { theme: "dark", words: "Dark" },
  { theme: "red", words: "Red on black, for the dome" },
];

export function lookCommands(shell: Shell, panels: readonly Panel[]): Command[] {
  const { page } = shell;
  const menu = "Look";
  const commands: readonly Command[] = [
    ...panels.map(
      ({ id, title, keys }): Command => ({
        id: `panel-${id}`,
        menu,
        words: title,
        keys,
        isOn: () => page.preferences().panel === id,
        run: () => shell.showPanel(id),
      }),
    ),
    {
      id: "no-panel",
      menu,
      words: "Nothing beside the table",
      keys: "Alt+0",
      isOn: () => page.preferences().panel === "",
      run: () => page.prefer({ panel: "" }),
    },
    {
      id: "plots",
      menu,
      words: "Plots",
      keys: "Alt+P",
      isOn: () => page.preferences().plots,
      run: () => page.prefer({ plots: !page.preferences().plots }),
    },
    ...themes.map(
      ({ theme, words }, index): Command => ({
        id: `theme-${theme}`,
        menu,
        words,
        apart: index === 0,
        isOn: () => page.preferences().theme === theme,
        run: () => page.prefer({ theme }),
      }),
    ),
    {
      id: "flash",
      menu,
      words: "Flash what changed",
      apart: true,
      isOn: () => page.preferences().flash,
      run: () => page.prefer({ flash: !page.preferences().flash }),
    },
  ];
  return commands.map((command) => ({ ...command, leavesTyping: true }));
}
