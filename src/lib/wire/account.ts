import { roles } from "#lib/policy/index.ts";
import { z } from "zod";

export const passwordLength = { least: 8, most: 128 } as const;

const email = z.email("Type an e-mail address such as ana@example.org.").max(254, "This address is too long.");
const newPassword = z
  .string()
  .min(passwordLength.least, `Use at least ${passwordLength.least} characters.`)
  .max(passwordLength.most, `Use at most ${passwordLength.most} characters.`);
const name = z.string().trim().min(1, "Type the name your team knows you by.").max(80, "Use at most 80 characters.");

export const signInInput = z.strictObject({ email, password: z.string().min(1, "Type your password.") });
export const signUpInput = z.strictObject({ name, email, password: newPassword });
export const emailInput = z.strictObject({ email });
export const newPasswordInput = z.strictObject({ password: newPassword });
export const accountNameInput = z.strictObject({ name });
export const teamNameInput = z.strictObject({
  name: z.string().trim().min(1, "Type a name for the team.").max(80, "Use at most 80 characters."),
});
export const invitationInput = z.strictObject({ email, role: z.enum(roles) });
