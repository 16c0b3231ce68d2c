import type { Warning } from "#lib/circuit/index.ts";
import { TextWithSymbols } from "./TextWithSymbols.tsx";

const words = { note: "Note.", caution: "Caution.", fault: "Fault." } as const;

/** What the stage has to say about its own figures; read out by `SpokenResults`, once they have settled. */
export function Warnings({ warnings }: { warnings: readonly Warning[] }) {
  return (
    <div className="warnings">
      {warnings.map((warning) => (
        <p key={warning.code + warning.message} className={warning.severity}>
          <strong>{words[warning.severity]}</strong> <TextWithSymbols text={warning.message} />
        </p>
      ))}
    </div>
  );
}
