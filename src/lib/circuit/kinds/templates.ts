import type { VoiceTemplate } from "../voice/template.ts";
import { struckTone } from "./struckTone.ts";
import { twoPathNoise } from "./twoPathNoise.ts";

/** What a new voice can begin with. Stands beside the registry, since a template is made of kinds. */
export const voiceTemplates = [
  twoPathNoise,
  struckTone,
  { id: "empty", name: "Empty", summary: "Nothing yet.", stages: [], links: [] },
] as const satisfies readonly VoiceTemplate[];

export type VoiceTemplateId = (typeof voiceTemplates)[number]["id"];
