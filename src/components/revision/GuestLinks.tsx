import { useState, type SyntheticEvent } from "react";
import { FormMessage } from "../forms/FormMessage.tsx";
import { useAction } from "../team/useAction.ts";
import { Confirmed } from "../voice/Confirmed.tsx";

export interface GuestLinkRow {
  id: string;
  since: string;
  until: string | null;
  openings: number;
}

interface GuestLinksProps {
  voiceId: string;
  number: number;
  links: GuestLinkRow[];
}

const spans = [
  { days: 7, label: "A week" },
  { days: 30, label: "30 days" },
  { days: 365, label: "A year" },
  { days: 0, label: "Until it is revoked" },
];
const day = 24 * 60 * 60 * 1000;

/** Addresses that open this revision without an account. */
export function GuestLinks({ voiceId, number, links: first }: GuestLinksProps) {
  const [links, setLinks] = useState(first);
  const [days, setDays] = useState(30);
  const [made, setMade] = useState<string | null>(null);
  const { busy, failure, run } = useAction();
  const path = `/api/voices/${voiceId}/share-links`;

  const make = (event: SyntheticEvent) => {
    event.preventDefault();
    const until = days === 0 ? null : new Date(Date.now() + days * day).toISOString();
    const body = { revision: number, ...(until === null ? {} : { expiresAt: until }) };
    void run<{ id: string; url: string; createdAt: string }>(
      path,
      { method: "POST", body },
      ({ id, url, createdAt }) => {
        setMade(url);
        setLinks([{ id, since: createdAt.slice(0, 10), until: until?.slice(0, 10) ?? null, openings: 0 }, ...links]);
      },
    );
  };
  return (
    <div>
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      {made !== null && (
        <div className="done mb-3" role="status">
          <strong>Guest link.</strong> Copy it now: it is shown this once.
          <a className="mt-1 block wrap-anywhere" href={made}>
            {made}
          </a>
        </div>
      )}
      <form method="post" onSubmit={make}>
        <div className="field">
          <label htmlFor="guest-span">A guest link opens this revision without an account, for</label>
          <select
            id="guest-span"
            className="input"
            value={days}
            onChange={(event) => setDays(Number(event.target.value))}
          >
            {spans.map(({ days: count, label }) => (
              <option key={count} value={count}>
                {label}
              </option>
            ))}
          </select>
        </div>
        <p className="mt-2">
          <button type="submit" className="btn" aria-disabled={busy}>
            Make a guest link
          </button>
        </p>
      </form>
      {links.length > 0 && (
        <ul className="rows mt-3">
          {links.map(({ id, since, until, openings }) => (
            <li key={id} className="flex flex-wrap items-baseline gap-x-3 py-2">
              <span>
                Made {since}
                <span className="block text-small text-ink-2">
                  {until === null ? "until revoked" : `until ${until}`}, opened{" "}
                  {openings === 1 ? "once" : `${openings} times`}
                </span>
              </span>
              <span className="ml-auto">
                <Confirmed
                  label="Revoke"
                  warning="Whoever has this address finds nothing there any more."
                  confirmLabel="Revoke it"
                  keepLabel="Keep it"
                  busy={busy}
                  onConfirm={() =>
                    void run(`${path}/${id}`, { method: "DELETE" }, () =>
                      setLinks(links.filter((link) => link.id !== id)),
                    )
                  }
                />
              </span>
            </li>
          ))}
        </ul>
      )}
    </div>
  );
}
