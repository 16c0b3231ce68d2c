/** Files of a stage kind that only the server draws from. */
const serverDrawn = /\/circuit\/kinds\/.+\/(?:formulas|sources|reference)\.ts$/;
const exported = /^export (?:const (\w+)[^=]*?=\s*(.)|function (\w+))/gm;
const emptyOf = { "[": "[]", "{": "{}", "(": "() => []" };

/**
 * Leaves formulas, sources and worked cases out of what the browser is sent of a stage kind: the page has them drawn
 * already. A file that exports anything but lists, objects and functions is sent whole.
 */
export const leaveOut = () => ({
  name: "clatterbench:leave-out",
  enforce: "pre",
  transform(code, id, { ssr = false } = {}) {
    if (ssr || !serverDrawn.test(id)) return undefined;
    const empty = [...code.matchAll(exported)].map(([, constant, first = "(", made]) => ({
      name: constant ?? made,
      value: emptyOf[first],
    }));
    const whole = empty.length !== code.match(/^export /gm)?.length || empty.some(({ value }) => value === undefined);
    if (whole) return undefined;
    return { code: empty.map(({ name, value }) => `export const ${name} = ${value};`).join("\n"), map: null };
  },
});
