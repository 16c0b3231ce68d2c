import { seriesNames } from "#lib/circuit/index.ts";
import type { SeriesChoice } from "#lib/wire/stageState.ts";
import { watchable, type Stage } from "./useStage.ts";

interface PartChoosersProps {
  stage: Stage;
  id: string;
}

/** Which preferred series resistors and capacitors are taken from, and which figure the last column watches. */
export function PartChoosers({ stage, id }: PartChoosersProps) {
  const { kind, topology, state, actions, analysis, watched, setWatched } = stage;
  const classes = new Set(Object.values(topology.parts).map(({ partClass }) => partClass));
  const offered = (["resistor", "capacitor"] as const).filter((name) => classes.has(name));
  const figures = watchable(kind, topology).filter((key) => key === watched || analysis.results[key] !== undefined);
  return (
    <span className="part-choosers">
      {offered.map((name) => (
        <span key={name}>
          <label htmlFor={`${id}-${name}`}>{name === "resistor" ? "Resistors" : "Capacitors"}</label>
          <select
            id={`${id}-${name}`}
            className="select-plain"
            value={state.series[name]}
            onChange={(event) =>
              actions.setSeries({ ...state.series, [name]: event.target.value as SeriesChoice[typeof name] })
            }
          >
            {seriesNames.map((series) => (
              <option key={series} value={series}>
                {series}
              </option>
            ))}
          </select>
        </span>
      ))}
      {figures.length > 1 && (
        <span className="only-wide">
          <label htmlFor={`${id}-moves`}>Moves of</label>
          <select
            id={`${id}-moves`}
            className="select-plain"
            value={watched}
            onChange={(event) => setWatched(event.target.value)}
          >
            {figures.map((key) => (
              <option key={key} value={key}>
                {topology.results[key]!.label}
              </option>
            ))}
          </select>
        </span>
      )}
    </span>
  );
}
