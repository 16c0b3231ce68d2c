import type { AnyTopology } from "#lib/circuit/index.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { SymbolText } from "../sheet/SymbolText.tsx";
import { windowTexts } from "./settings.ts";
import type { Spread } from "./useSpread.ts";

interface AskWindowsProps {
  topology: AnyTopology;
  state: StageState;
  spread: Spread;
  id: string;
}

/** Which result is looked at, and what a good board is. */
export function AskWindows({ topology, state, spread, id }: AskWindowsProps) {
  const { settings, change, faults, view } = spread;
  const texts = windowTexts(topology, state, settings);
  const results = Object.entries(topology.results).filter(
    ([name, { list, words }]) => list !== true && words === undefined && (view === null || name in view.nominal),
  );
  const typed = (name: string, side: "least" | "most", text: string) =>
    change({ windows: { ...settings.windows, [name]: { ...texts[name]!, [side]: text } } });
  return (
    <>
      <div className="field">
        <label htmlFor={`${id}-result`}>Look at</label>
        <select
          id={`${id}-result`}
          className="input"
          value={settings.result}
          onChange={(event) => change({ result: event.target.value })}
        >
          {results.map(([name, { label, unit }]) => (
            <option key={name} value={name}>
              {unit === "dB" ? `${label}, dB` : label}
            </option>
          ))}
        </select>
      </div>
      <fieldset className="spread-windows">
        <legend>A good board has</legend>
        {Object.entries(texts).map(([name, { least, most }]) => {
          const { label, symbol, unit } = topology.results[name]!;
          const fault = faults[`window-${name}`];
          const share = view?.windows[name];
          const input = (side: "least" | "most", text: string) => (
            <input
              className="input input-cell"
              type="text"
              autoComplete="off"
              spellCheck={false}
              aria-label={`${label}, ${side}${unit === "" ? "" : `, ${unit}`}`}
              aria-invalid={fault !== undefined || undefined}
              aria-describedby={`${id}-window-${name}`}
              value={text}
              onChange={(event) => typed(name, side, event.target.value)}
            />
          );
          return (
            <div key={name} className="spread-window">
              <span className="spread-window-name">
                {label}
                {symbol !== "" && (
                  <>
                    , <SymbolText symbol={symbol} />
                  </>
                )}
              </span>
              <span className="spread-window-sides">
                {input("least", least)} <span>to</span> {input("most", most)} <span className="dim">{unit}</span>
              </span>
              <p id={`${id}-window-${name}`} className={fault === undefined ? "field-note" : "field-note error"}>
                {fault ?? (share === undefined ? "Not asked for." : `Kept by ${percent(share)} of the boards.`)}
              </p>
            </div>
          );
        })}
      </fieldset>
    </>
  );
}

/** Shares near none or all keep the digits that tell them apart. */
export function percent(share: number, digits = shareDigits(share)): string {
  return `${(100 * share).toFixed(digits)} %`;
}

export function shareDigits(share: number): number {
  const away = Math.min(share, 1 - share);
  if (away < 1e-12) return 0;
  return away < 0.001 ? 3 : away < 0.01 ? 2 : 1;
}
