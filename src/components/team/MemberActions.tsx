import { roles, type Role } from "#lib/policy/index.ts";
import { Confirmed } from "../voice/Confirmed.tsx";
import { FormMessage } from "../forms/FormMessage.tsx";
import { useAction } from "./useAction.ts";

interface MemberActionsProps {
  userId: string;
  name: string;
  role: Role;
  /** Whether this row is of the person who looks at it. */
  self: boolean;
}

/** What an owner can do with a member: another role, hand the team over, take them out. */
export function MemberActions({ userId, name, role, self }: MemberActionsProps) {
  const { busy, failure, run } = useAction();
  const path = `/api/team/members/${userId}`;
  return (
    <div className="row-actions" role="group" aria-label={`Change ${name}`}>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <span>
        <label htmlFor={`role-${userId}`} className="sr-only">
          Role of {name}
        </label>
        <select
          id={`role-${userId}`}
          className="select-plain"
          value={role}
          disabled={busy}
          onChange={(event) => void run(path, { method: "PATCH", body: { role: event.target.value } })}
        >
          {roles.map((word) => (
            <option key={word} value={word}>
              {word}
            </option>
          ))}
        </select>
      </span>
      {!self && role !== "owner" && (
        <Confirmed
          label="Hand the team over"
          warning={
            <>
              <strong>{name}</strong> becomes an owner and you become a designer.
            </>
          }
          confirmLabel="Hand it over"
          keepLabel="Stay owner"
          busy={busy}
          onConfirm={() => void run("/api/team/ownership", { method: "POST", body: { userId } })}
        />
      )}
      {!self && (
        <Confirmed
          label="Remove"
          warning={
            <>
              <strong>{name}</strong> no longer sees anything of this team. What they made stays, under their name.
            </>
          }
          confirmLabel="Remove from the team"
          keepLabel="Keep"
          busy={busy}
          onConfirm={() => void run(path, { method: "DELETE" })}
        />
      )}
    </div>
  );
}

/** For everybody: leave the team. */
export function LeaveTeam({ userId, team }: { userId: string; team: string }) {
  const { busy, failure, run } = useAction();
  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <Confirmed
        label="Leave this team"
        warning={
          <>
            You no longer see anything of <strong>{team}</strong>. What you made stays, under your name; only an owner
            can invite you back.
          </>
        }
        confirmLabel="Leave it"
        keepLabel="Stay"
        busy={busy}
        onConfirm={() =>
          void run(`/api/team/members/${userId}`, { method: "DELETE" }, () => window.location.assign("/account"))
        }
      />
    </>
  );
}
