import { FormMessage } from "../forms/FormMessage.tsx";
import { useAction } from "../team/useAction.ts";

export interface SessionRow {
  id: string;
  /** What is known of the browser, in words. */
  where: string;
  since: string;
  current: boolean;
}

/** Where a person is signed in. */
export function Sessions({ sessions }: { sessions: SessionRow[] }) {
  const { busy, failure, run } = useAction();
  return (
    <>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      <ul className="rows">
        {sessions.map(({ id, where, since, current }) => (
          <li key={id} className="flex flex-wrap items-baseline gap-x-3 py-2">
            <span className="wrap-anywhere">
              {where}
              <span className="block text-small text-ink-2">since {since} UTC</span>
            </span>
            {current ? (
              <span className="ml-auto text-small text-ink-2">this browser</span>
            ) : (
              <button
                type="button"
                className="btn-text ml-auto"
                aria-disabled={busy}
                onClick={() => void run(`/api/account/sessions/${id}`, { method: "DELETE" })}
              >
                Sign out there
              </button>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}
