import type { Role } from "./roles.ts";

interface Rule {
  /** Roles that may do it to what their own team owns. */
  roles: readonly Role[];
  /** A person may never do this to what they made themselves. */
  neverOnesOwn?: true;
  /** Only the person who wrote it may do this, whatever their role. */
  onlyOnesOwn?: true;
}

const everyone = ["viewer", "builder", "reviewer", "designer", "owner"] as const;
const workshop = ["builder", "reviewer", "designer", "owner"] as const;
const drawing = ["designer", "owner"] as const;

/** Who may do what, one row for each thing that can be asked for. Screens and server read this same table. */
export const matrix = {
  "voice.list": { roles: everyone },
  "voice.read": { roles: everyone },
  "voice.create": { roles: drawing },
  "voice.rename": { roles: drawing },
  "voice.remove": { roles: drawing },
  "voice.removeReleased": { roles: ["owner"] },

  "workingCopy.read": { roles: workshop },
  "workingCopy.edit": { roles: drawing },

  "revision.readReleased": { roles: everyone },
  "revision.read": { roles: workshop },
  "revision.make": { roles: drawing },
  "revision.askForReview": { roles: drawing },
  "revision.review": { roles: ["reviewer", "owner"], neverOnesOwn: true },

  "comment.read": { roles: workshop },
  "comment.write": { roles: workshop },
  "comment.change": { roles: workshop, onlyOnesOwn: true },
  "comment.resolve": { roles: workshop },

  "activity.read": { roles: workshop },

  "measurement.add": { roles: workshop },
  "build.keep": { roles: workshop },

  "partData.edit": { roles: drawing },
  "shareLink.make": { roles: ["owner"] },
  "shareLink.revoke": { roles: ["owner"] },
  "shareLink.list": { roles: ["owner"] },

  "team.read": { roles: everyone },
  "team.rename": { roles: ["owner"] },
  "team.invite": { roles: ["owner"] },
  "team.changeRoles": { roles: ["owner"] },
  "team.handOver": { roles: ["owner"] },
} as const satisfies Record<string, Rule>;

export type Action = keyof typeof matrix;

export const actions = Object.keys(matrix) as Action[];

export function ruleFor(action: Action): Rule {
  return matrix[action];
}
