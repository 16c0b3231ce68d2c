import { readoutText, type PlotModel } from "./plotModel.ts";

/** The curve as a table, for whoever would rather read than look. */
export function PlotFigures({ model }: { model: PlotModel }) {
  const rows = model.x.ticks.map((tick) => nearest(model.xs, tick));
  return (
    <details className="plot-figures">
      <summary>Show figures</summary>
      <div className="table-scroll">
        <table className="table">
          <caption className="sr-only">{model.name}</caption>
          <thead>
            <tr>
              <th scope="col" className="right">
                {model.x.plainTitle}
              </th>
              {model.lines.map((line) => (
                <th key={line.id} scope="col" className="right">
                  {model.lines.length > 1 ? line.label : model.y.plainTitle}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.map((index, i) => (
              <tr key={model.x.ticks[i]}>
                <th scope="row" className="right num">
                  {readoutText(model.xs[index]!, model.x.unit)}
                </th>
                {model.lines.map((line) => (
                  <td key={line.id} className="right">
                    {line.ys[index] === null ? "–" : readoutText(line.ys[index]!, model.y.unit)}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </details>
  );
}

function nearest(xs: readonly number[], wanted: number): number {
  let best = 0;
  xs.forEach((x, i) => {
    if (Math.abs(x - wanted) < Math.abs(xs[best]! - wanted)) best = i;
  });
  return best;
}
