// What is felt is heard, too: not every phone vibrates for a page, and gloves feel little.
//
// Sounds are made, not loaded: a short tone each, loud at once and then dying away.

import { onPython } from "./python.js";

const TONES = { tap: [1200], done: [880, 1320], again: [440, 330] }; // [Hz]
const LENGTH = 0.09; // [s]
const LOUDNESS = 0.4;

let context;

/** Sound one of the cues; silent where the browser has no sound or forbids it. */
export function sound(name) {
  context ??= globalThis.AudioContext && new AudioContext();
  if (context?.state === "suspended") context.resume();
  let at = context?.currentTime;
  for (const pitch of context ? TONES[name] : []) {
    const tone = new OscillatorNode(context, { frequency: pitch });
    const volume = new GainNode(context, { gain: LOUDNESS });
    volume.gain.setValueAtTime(LOUDNESS, at);
    volume.gain.exponentialRampToValueAtTime(0.001, at + LENGTH);
    tone.connect(volume).connect(context.destination);
    tone.start(at);
    at += LENGTH;
    tone.stop(at);
  }
}

onPython("sound", ({ name }) => sound(name));
