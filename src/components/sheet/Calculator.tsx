import { useEffect, useRef, useState } from "react";
import { useTopology } from "#lib/client/stage/useTopology.ts";
import type { KindBrief } from "#lib/wire/kindBrief.ts";
import { writeAddress } from "#lib/wire/stageAddress.ts";
import type { StageState } from "#lib/wire/stageState.ts";
import { later } from "../page/later.tsx";
import type { VoiceChoice } from "./SaveToVoice.tsx";
import { StageSheet } from "./StageSheet.tsx";

const SaveToVoice = later(() => import("./SaveToVoice.tsx").then((module) => module.SaveToVoice), {
  waiting: "Looking up the team’s voices…",
  className: "save-panel",
});

interface CalculatorProps {
  kind: KindBrief;
  initial: StageState;
  signedIn: boolean;
  /** The voice that the stage is meant for, where this person may edit it. */
  voice?: VoiceChoice | undefined;
  /** As the address names it, known or not. */
  voiceId?: string | null;
}

/** Browsers refuse more than about a hundred address changes in half a minute. */
const pause = 350;

/** The public calculator: a stage sheet whose state stands in the page's address, so that a link shares it. */
export function Calculator(props: CalculatorProps) {
  // The island itself must not wait: the framework calls it once, outside React, to see what it is.
  return <AddressedStage {...props} />;
}

function AddressedStage({ kind, initial, signedIn, voice, voiceId = null }: CalculatorProps) {
  const topology = useTopology(kind.id, initial.topology);
  const [state, setState] = useState(initial);
  const [saving, setSaving] = useState(false);
  const timer = useRef<ReturnType<typeof setTimeout>>(undefined);
  const queryOf = (next: StageState) => {
    const query = writeAddress(topology, next);
    return voiceId === null ? query : `${query}&voice=${encodeURIComponent(voiceId)}`;
  };
  const address = `/calculators/${kind.id}?${queryOf(state)}`;

  const onChange = (next: StageState) => {
    setState(next);
    clearTimeout(timer.current);
    timer.current = setTimeout(() => {
      window.history.replaceState(window.history.state, "", `?${queryOf(next)}`);
    }, pause);
  };
  useEffect(() => () => clearTimeout(timer.current), []);

  return (
    <StageSheet
      kind={kind}
      topology={topology}
      initial={initial}
      onChange={onChange}
      actions={
        signedIn ? (
          <button
            type="button"
            className="btn btn-primary needs-js"
            aria-expanded={saving}
            onClick={() => setSaving(!saving)}
          >
            Save to a voice
          </button>
        ) : (
          <a className="btn btn-primary" href={`/sign-in?next=${encodeURIComponent(address)}`}>
            Sign in to save to a voice
          </a>
        )
      }
    >
      {saving && <SaveToVoice kind={kind} topology={topology} state={state} meant={voice} />}
    </StageSheet>
  );
}
