export type FigureState = "within" | "close" | "outside" | "unknown";

const shapes: Record<FigureState, string> = {
  within: "M1 5.500L3.800 8.500 9 1.500",
  close: "M5 1.200L9.300 8.800H.7Z",
  outside: "M1.500 1.500L8.500 8.500M8.500 1.500L1.500 8.500",
  unknown: "M1 5H9",
};

/** Each state in a word. */
export const stateWords: Record<FigureState, string> = {
  within: "within",
  close: "close",
  outside: "outside",
  unknown: "no target",
};

/** The state of a figure against its window: shape, word and colour, so that none has to be seen alone. */
export function StateMark({ state, word = stateWords[state] }: { state: FigureState; word?: string }) {
  return (
    <span className={`state-mark ${state}`}>
      <svg viewBox="0 0 10 10" aria-hidden="true">
        <path d={shapes[state]} />
      </svg>
      {word}
    </span>
  );
}
