export interface Letter {
  subject: string;
  text: string;
  html: string;
  /** Where a mail program may stop such mails with one press (RFC 8058). */
  unsubscribe?: string;
}

const escapes: Record<string, string> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;", "'": "&#39;" };

const escape = (text: string) => text.replace(/[&<>"']/g, (sign) => escapes[sign] ?? sign);

// Mail programs read neither style sheets nor custom properties, so the palette of tokens.css is repeated here.
const colours = {
  paper: "#f6f4ee",
  sheet: "#fffefa",
  rule: "#d6d0bf",
  ink: "#1c2126",
  faint: "#565a57",
  accent: "#1f6a60",
};

const mark = `<svg width="34" height="18" viewBox="0 0 34 18" aria-hidden="true"><path d="M2 2v14M6 5v11M10 8v8M14 11v5" stroke="${colours.accent}" stroke-width="2" fill="none"/><path d="M18 3c2 9 6 12 14 13" stroke="${colours.ink}" stroke-width="1.5" fill="none"/></svg>`;

interface Content {
  subject: string;
  greeting: string;
  paragraphs: readonly string[];
  action: { label: string; url: string };
  closing: string;
}

export function letter({ subject, greeting, paragraphs, action, closing }: Content): Letter {
  const text = [greeting, ...paragraphs, `${action.label}:\n${action.url}`, closing, "Clatterbench"].join("\n\n");
  const paragraph = (words: string) => `<p style="margin:0 0 14px">${escape(words)}</p>`;
  const html = `<!doctype html>
<html lang="en"><head><meta charset="utf-8"><title>${escape(subject)}</title></head>
<body style="margin:0;padding:28px 14px;background:${colours.paper};color:${colours.ink};font:15px/1.5 Inter,system-ui,sans-serif">
<div style="max-width:520px;margin:0 auto;background:${colours.sheet};border:1px solid ${colours.rule};padding:26px 28px">
<p style="margin:0 0 20px;font-weight:600">${mark} Clatterbench</p>
${[greeting, ...paragraphs].map(paragraph).join("\n")}
<p style="margin:20px 0"><a href="${escape(action.url)}" style="display:inline-block;padding:9px 16px;background:${colours.accent};color:#ffffff;text-decoration:none;font-weight:600">${escape(action.label)}</a></p>
<p style="margin:0 0 14px;color:${colours.faint};font-size:13px">If the button does nothing, open this address:<br><span style="word-break:break-all">${escape(action.url)}</span></p>
<p style="margin:18px 0 0;padding-top:12px;border-top:1px solid ${colours.rule};color:${colours.faint};font-size:13px">${escape(closing)}</p>
</div></body></html>`;
  return { subject, text, html };
}

export function verificationLetter({ name, url }: { name: string; url: string }): Letter {
  return letter({
    subject: "Confirm your e-mail address for Clatterbench",
    greeting: `Hello ${name},`,
    paragraphs: ["Confirm this address, and your account is ready to use. The link works for one hour."],
    action: { label: "Confirm this address", url },
    closing: "You did not ask for an account? Then leave this mail alone: without the confirmation nobody can sign in.",
  });
}

export function passwordResetLetter({ name, url }: { name: string; url: string }): Letter {
  return letter({
    subject: "Choose a new password for Clatterbench",
    greeting: `Hello ${name},`,
    paragraphs: ["Someone, most likely you, asked to choose a new password. The link works for one hour."],
    action: { label: "Choose a new password", url },
    closing: "You did not ask? Then leave this mail alone: your password stays as it is.",
  });
}

export function accountExistsLetter({ name, url }: { name: string; url: string }): Letter {
  return letter({
    subject: "You already have a Clatterbench account",
    greeting: `Hello ${name},`,
    paragraphs: [
      "Someone, most likely you, tried to sign up with this address, which already has an account. Nothing was changed.",
    ],
    action: { label: "Sign in", url },
    closing: "The password is forgotten? The sign-in page leads to a new one.",
  });
}

export function emailChangeLetter({ name, newEmail, url }: { name: string; newEmail: string; url: string }): Letter {
  return letter({
    subject: "Change the e-mail address of your Clatterbench account",
    greeting: `Hello ${name},`,
    paragraphs: [
      `Someone, most likely you, asked to use ${newEmail} instead of this address. Agree here first; then a second mail, to the new address, asks to confirm it. The link works for one hour.`,
    ],
    action: { label: "Agree to the new address", url },
    closing:
      "You did not ask? Then leave this mail alone: your account keeps this address. Choose a new password to be sure.",
  });
}

export function invitationLetter(about: { inviter: string; team: string; role: string; url: string }): Letter {
  return letter({
    subject: `Join ${about.team} on Clatterbench`,
    greeting: "Hello,",
    paragraphs: [
      `${about.inviter} invites you to work in the team ${about.team} as ${about.role}. The invitation stands for a week.`,
    ],
    action: { label: "See the invitation", url: about.url },
    closing: "You do not know this team? Then leave this mail alone, and nothing happens.",
  });
}
