import { TextField } from "../panel/TextField.tsx";
import type { StagePanelProps } from "../sheet/stagePanels.ts";
import { trimWindow, turnedResults, type TrimSettings } from "./settings.ts";
import type { Trim } from "./useTrim.ts";

/** What the knob must reach, and what sort of knob it is. */
export function AskTrim({ topology, state, kind, trim, id }: StagePanelProps & { trim: Trim; id: string }) {
  const { settings, change, faults } = trim;
  const window = trimWindow(topology, state, settings);
  const { unit } = topology.results[settings.result]!;
  const sides = unit === "" ? {} : { unit };
  return (
    <>
      <div className="field">
        <label htmlFor={`${id}-result`}>The pot sets</label>
        <select
          id={`${id}-result`}
          className="input"
          value={settings.result}
          onChange={(event) => change({ result: event.target.value, window: undefined })}
        >
          {turnedResults(topology, state, kind.telling).map((name) => (
            <option key={name} value={name}>
              {topology.results[name]!.label}
              {topology.results[name]!.unit === "dB" ? ", dB" : ""}
            </option>
          ))}
        </select>
      </div>
      <div className="spread-pair trim-window">
        <TextField
          id={`${id}-least`}
          label="It must reach from"
          {...sides}
          value={window.least}
          onText={(least) => change({ window: { ...window, least } })}
          fault={faults["window"]}
        />
        <TextField
          id={`${id}-most`}
          label="to"
          {...sides}
          value={window.most}
          onText={(most) => change({ window: { ...window, most } })}
        />
      </div>
      <div className="field">
        <label htmlFor={`${id}-law`}>Law of the pot</label>
        <select
          id={`${id}-law`}
          className="input"
          value={`${settings.law} ${settings.shape}`}
          onChange={(event) => {
            const [law, shape] = event.target.value.split(" ") as [TrimSettings["law"], TrimSettings["shape"]];
            change({ law, shape });
          }}
        >
          <option value="linear curve">linear</option>
          <option value="logarithmic curve">logarithmic</option>
          <option value="logarithmic two-segment">logarithmic, two printed segments</option>
          <option value="reverse-logarithmic curve">reverse logarithmic</option>
          <option value="reverse-logarithmic two-segment">reverse logarithmic, two printed segments</option>
        </select>
      </div>
      <div className="spread-pair trim-window">
        <TextField
          id={`${id}-tolerance`}
          label="Its tolerance, ±"
          unit="%"
          value={settings.potTolerance}
          onText={(potTolerance) => change({ potTolerance })}
          fault={faults["potTolerance"]}
        />
        <TextField
          id={`${id}-end`}
          label="Left over at its end"
          unit="%"
          value={settings.end}
          onText={(end) => change({ end })}
          fault={faults["end"]}
          hint="Of the track."
        />
      </div>
    </>
  );
}
