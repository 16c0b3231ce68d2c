import { Refusal } from "../errors.ts";
import { presentWorkingCopy, type WorkingCopyRow } from "./present.ts";

/** Somebody saved since the sender read the working copy: the newer one goes along, so that nothing has to be asked for twice. */
export function staleCopy(current: WorkingCopyRow): Refusal {
  const { etag, copy } = presentWorkingCopy(current);
  return new Refusal(
    "stale-copy",
    "Someone saved a newer copy since you read it, so yours was not saved. The newer one is in `current`: put your changes into it and send it with its ETag.",
    { headers: { etag }, members: { current: copy } },
  );
}
