import type { VoiceAnswer } from "#lib/wire/voice.ts";
import type { Context } from "../context.ts";
import { loadVoice } from "./load.ts";
import { presentVoice } from "./present.ts";

export async function readVoice({ ctx, input }: { ctx: Context; input: { id: string } }): Promise<VoiceAnswer> {
  return presentVoice(await loadVoice(ctx.db, ctx, input.id, "voice.read"), ctx.actor);
}
