/** What the auth library answers when it refuses. */
export interface AuthFailure {
  code?: string | undefined;
  message?: string | undefined;
  status: number;
}

const byCode: Record<string, string> = {
  INVALID_EMAIL_OR_PASSWORD: "No account has this e-mail address and password. Check both, or set a new password.",
  EMAIL_NOT_VERIFIED:
    "This address is not confirmed yet. A new message is on its way to it: open the link inside, then sign in here.",
  USER_ALREADY_EXISTS: "An account with this address exists already. Sign in, or set a new password.",
  USER_ALREADY_EXISTS_USE_ANOTHER_EMAIL: "An account with this address exists already. Sign in, or set a new password.",
  PASSWORD_TOO_SHORT: "The password is too short. Choose a longer one.",
  PASSWORD_TOO_LONG: "The password is too long. Choose a shorter one.",
  INVALID_TOKEN: "This link has been used or is too old. Ask for a new one.",
  ORGANIZATION_ALREADY_EXISTS: "A team of this name exists already. Choose another name.",
};

/** Words for a refused request: what happened and what to do. What was typed stays in the form. */
export function authProblem({ code, message, status }: AuthFailure): string {
  const known = code === undefined ? undefined : byCode[code];
  if (known !== undefined) return known;
  // The one code under which our own server writes the words for the reader itself.
  if (code === "INVALID_INPUT" && message) return message;
  if (status === 429) return "Too many tries in a short time. Wait a minute, then try again; your entries stay here.";
  if (status === 401)
    return "You are signed out. Sign in again in another tab, then repeat this; your entries stay here.";
  if (status === 403) return "Your role in the team does not allow this. Ask an owner of the team.";
  if (status === 0 || status >= 500) return unreachable;
  return "This was refused. Check the entries and try again; they stay here.";
}

export const unreachable =
  "The server could not be reached or could not answer. Nothing was changed and your entries stay here: try again in a moment.";

/** Waits for an answer of the auth library; null when it agreed, else the words for the reader. */
export async function refusal(answer: Promise<{ error: AuthFailure | null }>): Promise<string | null> {
  try {
    const { error } = await answer;
    return error ? authProblem(error) : null;
  } catch {
    return unreachable;
  }
}
