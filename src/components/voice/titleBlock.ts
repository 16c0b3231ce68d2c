import type { VoiceAnswer } from "#lib/wire/voice.ts";
import type { TitleBlockCell } from "../page/titleBlockCell.ts";
import { savedDay } from "./savedTime.ts";

/** The title block of a voice as it stands in its working copy; a stage's sheet adds which of how many it is. */
export function voiceTitleBlock(voice: VoiceAnswer, sheet?: string): TitleBlockCell[] {
  return [
    { label: "Voice", value: voice.name, wide: true },
    { label: "Revision", value: "Working copy" },
    { label: "Status", value: "In preparation" },
    { label: "Prepared by", value: voice.createdBy?.name ?? "–" },
    { label: "Checked by", value: "–" },
    { label: "Date", value: savedDay(voice.updatedAt) },
    { label: "Sheet", value: sheet ?? `1 of ${voice.stageCount + 1}` },
  ];
}
