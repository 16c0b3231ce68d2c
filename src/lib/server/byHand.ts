import { Refusal } from "./errors.ts";

/** Lets only a signed-in person pass: a key that leaked must not be able to make others. */
export function byHand(locals: App.Locals): void {
  // A key that is none is told so by whoever asks for the actor.
  if (!locals.byKey || locals.actor === null) return;
  throw new Refusal("not-allowed", "Keys are looked after by a person who is signed in, not by another key.");
}
