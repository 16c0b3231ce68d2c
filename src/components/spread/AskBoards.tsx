import type { AnyTopology } from "#lib/circuit/index.ts";
import { TextField } from "../panel/TextField.tsx";
import type { Spread } from "./useSpread.ts";

const lotWords = { resistor: "Resistors", capacitor: "Capacitors", pot: "Pots" } as const;

/** How boards are drawn. */
export function AskBoards({ topology, spread, id }: { topology: AnyTopology; spread: Spread; id: string }) {
  const { settings, change, faults } = spread;
  const counts = new Map<keyof typeof lotWords, number>();
  for (const { partClass } of Object.values(topology.parts)) counts.set(partClass, (counts.get(partClass) ?? 0) + 1);
  const { temperature } = settings;
  return (
    <fieldset className="spread-boards">
      <legend>Boards</legend>
      <div className="spread-pair">
        <TextField
          id={`${id}-boards`}
          label="How many"
          value={settings.boards}
          onText={(boards) => change({ boards })}
          fault={faults["boards"]}
        />
        <TextField
          id={`${id}-seed`}
          label="Seed"
          value={settings.seed}
          onText={(seed) => change({ seed })}
          fault={faults["seed"]}
          hint="The same seed draws the same boards."
        />
      </div>
      <div className="field">
        <label htmlFor={`${id}-distribution`}>A tolerance is</label>
        <select
          id={`${id}-distribution`}
          className="input"
          value={settings.distribution}
          onChange={(event) => change({ distribution: event.target.value as typeof settings.distribution })}
        >
          <option value="uniform">a limit, every value in it equally likely</option>
          <option value="three-sigma">three standard deviations, normally spread</option>
        </select>
      </div>
      {[...counts]
        .filter(([, count]) => count > 1)
        .map(([partClass]) => (
          <label key={partClass} className="choice" htmlFor={`${id}-lot-${partClass}`}>
            <input
              id={`${id}-lot-${partClass}`}
              type="checkbox"
              checked={settings.lots[partClass]}
              onChange={(event) => change({ lots: { ...settings.lots, [partClass]: event.target.checked } })}
            />
            <span>{lotWords[partClass]} of one lot, erring together</span>
          </label>
        ))}
      <label className="choice" htmlFor={`${id}-warm`}>
        <input
          id={`${id}-warm`}
          type="checkbox"
          checked={temperature.on}
          onChange={(event) => change({ temperature: { ...temperature, on: event.target.checked } })}
        />
        <span>At any temperature of a range</span>
      </label>
      {temperature.on && (
        <div className="spread-pair">
          <TextField
            id={`${id}-cold`}
            label="Lowest"
            unit="°C"
            value={temperature.least}
            onText={(least) => change({ temperature: { ...temperature, least } })}
            fault={faults["temperature"]}
          />
          <TextField
            id={`${id}-hot`}
            label="Highest"
            unit="°C"
            value={temperature.most}
            onText={(most) => change({ temperature: { ...temperature, most } })}
          />
        </div>
      )}
    </fieldset>
  );
}
