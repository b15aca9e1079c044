// The tap clock: when did the finger touch the glass?
//
// The browser stamps each event when the touch happens. Flet's client passes the tap on without
// that time, and passing it on takes a while that varies with what the page is painting. So the
// stamp travels beside the tap: it is posted first, and Python matches the two by position.

import { onPython, toPython } from "./python.js";
import { sound } from "./sound.js";

const MILLISECONDS = 1000;

function stamp(event) {
  toPython({
    kind: "tap",
    seconds: event.timeStamp / MILLISECONDS,
    x: event.clientX,
    y: event.clientY,
  });
  sound("tap");
}

onPython("taps", ({ on }) => {
  // In the capture phase on the window nothing comes before us.
  if (on) addEventListener("pointerdown", stamp, { capture: true, passive: true });
  else removeEventListener("pointerdown", stamp, { capture: true });
});
