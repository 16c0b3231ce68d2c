import { can, type Actor } from "#lib/policy/index.ts";
import type { VoiceAnswer } from "#lib/wire/voice.ts";
import type { VoiceRow } from "./load.ts";

export function presentVoice(voice: VoiceRow, actor: Actor | null): VoiceAnswer {
  return {
    id: voice.id,
    name: voice.name,
    createdAt: voice.createdAt.toISOString(),
    updatedAt: voice.updatedAt.toISOString(),
    createdBy:
      voice.authorId !== null && voice.authorName !== null ? { id: voice.authorId, name: voice.authorName } : null,
    stageCount: voice.stageCount,
    can: {
      rename: can(actor, "voice.rename", voice),
      remove: can(actor, "voice.remove", voice),
      readWorkingCopy: can(actor, "workingCopy.read", voice),
      editWorkingCopy: can(actor, "workingCopy.edit", voice),
    },
  };
}
