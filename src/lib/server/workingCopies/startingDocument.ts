import { stageKinds } from "#lib/circuit/kinds/index.ts";
import { voiceTemplates, type VoiceTemplateId } from "#lib/circuit/kinds/templates.ts";
import { beginStages } from "#lib/circuit/voice/template.ts";
import { workingCopyDocument, type WorkingCopyDocument } from "#lib/wire/workingCopy.ts";

/** What a voice begins with; it passes the same check as a document that someone sends. */
export function startingDocument(templateId: VoiceTemplateId): WorkingCopyDocument {
  const template = voiceTemplates.find(({ id }) => id === templateId);
  if (!template) throw new Error(`there is no template ${templateId}`);
  const stages = beginStages(template, stageKinds);
  const { format, ...document } = workingCopyDocument.parse({
    format: 1,
    stages,
    links: template.links,
    conditions: {},
  });
  return { format, stages: document.stages, links: document.links, conditions: document.conditions };
}
