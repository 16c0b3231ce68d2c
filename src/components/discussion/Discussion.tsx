import { useState } from "react";
import type { CommentAnswer } from "#lib/wire/comment.ts";
import { failureText, request } from "#lib/client/request.ts";
import { FormMessage } from "../forms/FormMessage.tsx";
import { Remark } from "./Remark.tsx";
import { WriteRemark } from "./WriteRemark.tsx";

/** What a remark can be about, besides the whole revision. */
export interface PlaceChoice {
  /** Of the choice: `band`, `band part rb`, `band curve magnitude`. */
  key: string;
  label: string;
  at: { stage: string; part?: string; curve?: string };
}

interface DiscussionProps {
  voiceId: string;
  number: number;
  comments: CommentAnswer[];
  places: PlaceChoice[];
  /** Names that can be mentioned. */
  people: string[];
  mayWrite: boolean;
}

const keyOf = ({ stage, part, curve }: CommentAnswer["at"]) =>
  [stage, part && `part ${part}`, curve && `curve ${curve}`].filter(Boolean).join(" ");

/** Threads on a revision. What is typed stays whatever the server says. */
export function Discussion({ voiceId, number, comments: first, places, people, mayWrite }: DiscussionProps) {
  const [comments, setComments] = useState(first);
  const [failure, setFailure] = useState<string | null>(null);
  const path = `/api/voices/${voiceId}/comments`;

  const write = async (text: string, more: { thread?: string; at?: PlaceChoice["at"] }): Promise<boolean> => {
    setFailure(null);
    const answer = await request<CommentAnswer>(path, { method: "POST", body: { revision: number, text, ...more } });
    if (answer.kind !== "done") setFailure(failureText(answer));
    else setComments((before) => [...before, answer.body]);
    return answer.kind === "done";
  };
  const change = async (id: string, body: { text: string } | { resolved: boolean }): Promise<boolean> => {
    setFailure(null);
    const answer = await request<CommentAnswer>(`${path}/${id}`, { method: "PATCH", body });
    if (answer.kind !== "done") setFailure(failureText(answer));
    else setComments((before) => before.map((one) => (one.id === id ? answer.body : one)));
    return answer.kind === "done";
  };
  const remove = async (id: string) => {
    setFailure(null);
    const answer = await request(`${path}/${id}`, { method: "DELETE" });
    if (answer.kind !== "done") return setFailure(failureText(answer));
    const deletedAt = new Date().toISOString();
    setComments((before) =>
      before.map((one) => (one.id === id ? { ...one, text: "", deletedAt, can: { ...one.can, change: false } } : one)),
    );
  };

  const threads = comments.filter(({ thread }) => thread === null);
  const labels = new Map(places.map(({ key, label }) => [key, label]));
  return (
    <div className="discussion">
      {failure !== null && <FormMessage kind="fault">{failure}</FormMessage>}
      {threads.length === 0 && <p className="mb-3 text-ink-2">Nobody has written anything yet.</p>}
      {threads.map((thread) => {
        const answers = comments.filter((comment) => comment.thread === thread.id);
        const place = keyOf(thread.at);
        return (
          <section
            key={thread.id}
            className={thread.resolvedAt === null ? "thread" : "thread resolved"}
            aria-label={`Thread by ${thread.author.name}`}
          >
            {place !== "" && <p className="text-small text-ink-2">On {labels.get(place) ?? place}</p>}
            {[thread, ...answers].map((comment) => (
              <Remark
                key={comment.id}
                comment={comment}
                onRewrite={(text) => change(comment.id, { text })}
                onRemove={() => remove(comment.id)}
              />
            ))}
            <div className="row-actions">
              {thread.can.resolve && (
                <button
                  type="button"
                  className="btn-text"
                  onClick={() => void change(thread.id, { resolved: thread.resolvedAt === null })}
                >
                  {thread.resolvedAt === null ? "Resolve" : "Open again"}
                </button>
              )}
              {thread.resolvedBy !== null && <span>resolved by {thread.resolvedBy.name}</span>}
            </div>
            {mayWrite && thread.resolvedAt === null && (
              <WriteRemark
                label="Answer"
                idPrefix={thread.id}
                people={people}
                onWrite={(text) => write(text, { thread: thread.id })}
              />
            )}
          </section>
        );
      })}
      {mayWrite && (
        <WriteRemark
          label="Write"
          idPrefix="new-remark"
          people={people}
          places={places}
          open
          onWrite={(text, at) => write(text, at === undefined ? {} : { at })}
        />
      )}
    </div>
  );
}
