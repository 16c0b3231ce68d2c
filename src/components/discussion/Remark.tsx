import { useState, type SyntheticEvent } from "react";
import { longestComment, type CommentAnswer } from "#lib/wire/comment.ts";
import { savedTime } from "../voice/savedTime.ts";
import { Confirmed } from "../voice/Confirmed.tsx";

interface RemarkProps {
  comment: CommentAnswer;
  onRewrite: (text: string) => Promise<boolean>;
  onRemove: () => void;
}

/** One remark; its author can rewrite it or take it back. */
export function Remark({ comment, onRewrite, onRemove }: RemarkProps) {
  const { id, author, createdAt, editedAt, deletedAt, text } = comment;
  const [draft, setDraft] = useState<string | null>(null);
  const send = async (event: SyntheticEvent) => {
    event.preventDefault();
    if (draft !== null && draft.trim() !== "" && (await onRewrite(draft))) setDraft(null);
  };
  return (
    <article className="remark" id={id}>
      <p className="text-small text-ink-2">
        {author.name}, <time dateTime={createdAt}>{savedTime(createdAt)}</time> UTC
        {editedAt !== null && deletedAt === null && <span> · rewritten {savedTime(editedAt)}</span>}
      </p>
      {draft === null ? (
        deletedAt === null ? (
          <p className="whitespace-pre-line wrap-anywhere">{text}</p>
        ) : (
          <p className="text-ink-2">Taken back by its author.</p>
        )
      ) : (
        <form method="post" className="field" onSubmit={(event) => void send(event)}>
          <label htmlFor={`${id}-rewrite`}>Rewrite it</label>
          <textarea
            id={`${id}-rewrite`}
            className="input"
            rows={3}
            maxLength={longestComment}
            value={draft}
            autoFocus
            onChange={(event) => setDraft(event.target.value)}
          />
          <p className="mt-2 flex flex-wrap gap-2">
            <button type="submit" className="btn">
              Keep this
            </button>
            <button type="button" className="btn" onClick={() => setDraft(null)}>
              Leave it
            </button>
          </p>
        </form>
      )}
      {comment.can.change && draft === null && (
        <div className="row-actions" role="group" aria-label="Your remark">
          <button type="button" className="btn-text" onClick={() => setDraft(text)}>
            Rewrite
          </button>
          <Confirmed
            label="Take back"
            warning="Your words are gone for the team; that you wrote something stays."
            confirmLabel="Take it back"
            keepLabel="Keep it"
            busy={false}
            onConfirm={onRemove}
          />
        </div>
      )}
    </article>
  );
}
