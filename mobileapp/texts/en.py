"""English."""

from typing import Final

TEXTS: Final = {
    "app.name": "Sag & Bounce",
    "app.loading": "Getting the calculator ready …",
    "back": "Back",
    "undo": "Undo",
    "more": "more",
    "less": "less",
    "type": "Type {name}",
    "ok": "OK",
    "cancel": "Cancel",
    "stepper.more": "{name}: more",
    "stepper.less": "{name}: less",
    "input.not_a_number": "That isn't a number. Type digits, like 27.5.",
    # Whether it can be used without signal
    "offline.ready": "Ready offline",
    "offline.preparing": "Keeping the app on this device: {done} of {total} MB. Stay connected.",
    "offline.starting": "Keeping the app on this device. Stay connected.",
    "offline.insecure": (
        "This address can't work offline: browsers allow it only on https:// or localhost."
    ),
    "offline.unsupported": (
        "This browser can't keep the app for offline use here. A private window may be the reason."
    ),
    "offline.full": "Not ready offline: this device is full. Free some space, then reload.",
    "offline.network": "Not ready offline: the connection broke. Reload to go on where it stopped.",
    "offline.error": "Not ready offline: the browser refused. Reload, or try another browser.",
    "update.waits": "A new version is ready.",
    "update.apply": "Update",
    # What is kept
    "record.damaged": "One saved setup is damaged and can't be read. It was left as it is.",
    "record.newer": "One saved setup is from a newer version of the app. It was left as it is.",
    "store.full": "Not saved: this device is full. Free some space, then change a value again.",
    "store.failed": "Not saved: the browser refused. Note the values, then reload the page.",
    # Home
    "home.title": "Sag & Bounce",
    "home.sag": "Measure sag",
    "home.bounce": "Time a bounce",
    "home.saved": "Saved setups",
    "home.none": "Nothing saved yet. Each reading is saved as you make it.",
    "home.open": "Open {label}",
    "home.delete": "Delete {label}",
    "home.deleted": "Deleted “{label}”",
    "home.about": "About and cautions",
    "setup.unnamed": "Setup of {when}",
    # Settings
    "settings.title": "Settings",
    "settings.units": "Units",
    "settings.units.mixed": "mixed",
    "settings.units.metric": "metric",
    "settings.units.imperial": "inch",
    "settings.about.mixed": "mm, kg, km/h, and the pump's psi and the coil's lbf/in.",
    "settings.about.metric": "mm, kg, km/h, bar, N/mm.",
    "settings.about.imperial": "in, lb, mph, psi, lbf/in.",
    "settings.appearance": "Appearance",
    "settings.appearance.sun": "sun",
    "settings.appearance.dark": "dark",
    "settings.appearance.auto": "auto",
    "settings.language": "Language",
    "settings.language.auto": "auto",
    # Sag
    "sag.title": "Sag",
    "sag.front": "Front",
    "sag.rear": "Rear",
    "sag.travel.fork": "Fork travel",
    "sag.travel.shaft": "Shock stroke",
    "sag.travel.wheel": "Wheel travel",
    "sag.reading": "Sag reading",
    "sag.place": "Read at",
    "sag.place.shaft": "the shock",
    "sag.place.wheel": "the wheel",
    "sag.wheel_travel": "Wheel travel",
    "sag.how": (
        "Full kit, riding stance, brakes off. Push the O-ring to the seal, settle in gently, "
        "step off, read how far the O-ring moved."
    ),
    "sag.frequency": "Bounces at about",
    "sag.frequency.unknown": "Set the wheel travel to see the frequency that follows.",
    "sag.frequency.too_small": "So little sag can't be read closely enough for a frequency.",
    "sag.band": "usual {low} to {high} %",
    "sag.band.within": "inside the usual {low} to {high} %",
    "sag.band.below": "below the usual {low} to {high} %: stiffer than most ride it",
    "sag.band.above": "above the usual {low} to {high} %: softer than most ride it",
    "sag.band.open": "about at the edge of the usual {low} to {high} %; read again to be sure",
    "sag.maker": "Common practice; the maker's figure goes first.",
    "sag.error.travel": "Travel must be more than zero.",
    "sag.error.zero": "No sag yet. Set how far the O-ring moved.",
    "sag.error.negative": "Sag can't be below zero.",
    "sag.error.beyond": (
        "Sag can't reach the full travel of {travel}. Is this the right travel? Shock or wheel?"
    ),
    "sag.unusual": "Outside what bikes are ridden with; check units and where it was read.",
    "sag.picture.front": "Read from the fork's seal to the O-ring on its tube.",
    "sag.picture.rear": "Read from the shock's seal to the O-ring on its shaft.",
    "sag.gauge": "{end}: sag {percent}. {band}",
    "sag.next": "Time a bounce",
    # Bounce
    "bounce.title": "Bounce",
    "bounce.pad": "Tap at every bottom",
    "bounce.pad.first": "Bike held, rider bounces and lets the bike set the rhythm. "
    "Tap here each time the bike is at its lowest.",
    "bounce.picture": "A bounce over time, with a tap at each of its lowest points.",
    "bounce.again": "Start again",
    "bounce.finish": "Done",
    "bounce.keep_going": "Keep going",
    "bounce.done": "Done. Saved.",
    "bounce.start_again": "Start again",
    "bounce.kept": "Saved as it is.",
    "bounce.keep": "Save now",
    "bounce.beats": "Beats so far: {counts}",
    "bounce.beats.used": "{count} used",
    "bounce.beats.warm_up": "{count} to get going",
    "bounce.beats.missed": "{count} missed",
    "bounce.beats.doubled": "{count} doubled",
    "bounce.beats.outlier": "{count} off the beat",
    "bounce.every": "Tap at",
    "bounce.every.1": "every bottom",
    "bounce.every.2": "every 2nd",
    "bounce.pad.2": "Tap at every second bottom",
    "bounce.no_clock": "The browser gives no exact tap times here, so the ± is wider.",
    "bounce.rhythm": (
        "This is the rider's rhythm. A rider can keep one up to a tenth away from the bike's own."
    ),
    # From one step to the next
    "steps": "Go on with",
    "steps.sag": "Sag",
    "steps.bounce": "Bounce",
    "steps.rebound": "Rebound",
    "steps.trail": "Trail",
    "steps.balance": "Balance",
    # Rebound
    "rebound.title": "Rebound",
    "rebound.how": (
        "Rider on, brakes off, ground level. Mark the sag. Push down well past the mark, let go "
        "at once, and watch it come back."
    ),
    "rebound.end": "Which end",
    "rebound.way": "Overshoot, read by",
    "rebound.way.ruler": "ruler",
    "rebound.way.film": "film",
    "rebound.way.not_passed": "none",
    "rebound.push": "Push, below the sag mark",
    "rebound.overshoot": "Overshoot, above the sag mark",
    "rebound.frames": "From letting go to passing the mark",
    "rebound.rate": "Frames per second of the camera",
    "rebound.not_passed": "It crept back to the sag mark and did not pass it.",
    "rebound.hand": (
        "A stopwatch in the hand can't do this: its ± would be as wide as the whole scale."
    ),
    "rebound.clicks": "Rebound, opened from closed",
    "rebound.picture": (
        "The wheel over time: from the push up past the sag mark, over it, and back."
    ),
    "rebound.missing.frames": "No frames yet. Count them from letting go to passing the mark.",
    "rebound.missing.frequency": (
        "A film needs this end's frequency: measure sag or time a bounce first."
    ),
    "rebound.missing.push": "No push yet. Set how far below the mark it was let go.",
    "rebound.missing.overshoot": (
        "No overshoot yet. Set how far above the mark it went, or choose “none”."
    ),
    "rebound.damping": "Damping ratio",
    "rebound.at_least": "at least {ratio}",
    "rebound.scale.low": "springy",
    "rebound.scale.high": "slow",
    "rebound.scale": "Damping ratio {ratio}; one overshoot, then settle, is 0.35 to 0.6.",
    "rebound.turn.close": "Close rebound: more damping",
    "rebound.turn.open": "Open rebound: less damping",
    "rebound.turn.keep": "Keep it: one overshoot, then settle",
    "rebound.turn.measure": "Slow enough, maybe too slow: open two clicks and read again",
    "rebound.sure": "The ± leaves no doubt.",
    "rebound.unsure": "Within the ± it may be otherwise: read once more.",
    "rebound.settled": "The bike's swing shrinks to a third in {time}.",
    "rebound.returned": "The wheel is two thirds back after {time}.",
    "rebound.again": "I turned it: read again",
    "rebound.tries": "Reading {count} at this end",
    "rebound.clicks.keep": "By the two settings, {clicks} clicks from closed fits: keep it.",
    "rebound.clicks.open": "By the two settings: open {turn}, to {clicks} clicks from closed.",
    "rebound.clicks.close": "By the two settings: close {turn}, to {clicks} clicks from closed.",
    # Trail
    "trail.title": "Trail",
    "trail.how": (
        "The day's repeated bumps: braking bumps, roots, ripples. Pace out their spacing from "
        "crest to crest, judge their height from trough to crest."
    ),
    "trail.slowest": "Slowest over them",
    "trail.fastest": "Fastest over them",
    "trail.bump": "Bumps {count}",
    "trail.spacing": "Spacing",
    "trail.height": "Height",
    "trail.add": "Other bumps, too",
    "trail.remove": "Remove bumps {count}",
    "trail.numbers": "Numbers",
    "trail.at": "at {speed}",
    "trail.missing.zero": "Spacing, height and speed must be more than zero.",
    "trail.missing.order": "The fastest speed must be more than the slowest.",
    "trail.missing.frequency": (
        "This needs the bike's frequency: measure sag or time a bounce first."
    ),
    "trail.says.follows_follows": (
        "{end}: it goes up and down with these bumps; they would rock it most at {resonant}."
    ),
    "trail.says.follows_resonates": (
        "{end}: these bumps rock it most at {resonant}, and you ride near that."
    ),
    "trail.says.follows_filters": (
        "{end}: around {resonant} these bumps rock it; above {filtering} it smooths them."
    ),
    "trail.says.resonates_resonates": (
        "{end}: at these speeds the bumps rock it most. Only above {filtering} it smooths them."
    ),
    "trail.says.resonates_filters": (
        "{end}: slow, near {resonant}, the bumps rock it; above {filtering} it smooths them."
    ),
    "trail.says.filters_filters": (
        "{end}: it smooths these bumps at all these speeds; {percent} % get through at {fast}."
    ),
    "trail.lifts": "From {speed} on the wheel can't follow and leaves the ground.",
    "trail.assumed.rebound": "Rebound damping is assumed as usual: measure it to be sure.",
    "trail.assumed.compression": "Compression damping is assumed at two fifths of rebound.",
    "trail.row.forcing": "Bumps a second",
    "trail.row.through": "Gets through",
    "trail.row.drop": "Rides lower by",
    "trail.row.recovered": "Back before the next bump",
    "trail.row.packed": "Packed down, of a stroke",
    "trail.row.stroke": "Stroke, up and down from sag",
    "trail.row.wheel_speed": "Wheel speed, peak",
    "trail.row.wheel_acceleration": "Wheel acceleration, peak",
    "trail.row.shaft_speed": "Shaft speed, peak",
    "trail.row.circuit": "Damping that works",
    "trail.row.contact": "Least load on the ground",
    "trail.circuit.low": "low speed",
    "trail.circuit.crossover": "both",
    "trail.circuit.high": "high speed",
    "trail.chart": (
        "How much of the bumps gets through at each speed. The day's speeds lie between the "
        "upright lines; at 100 % nothing is smoothed."
    ),
    # Balance
    "balance.title": "Balance",
    "balance.first": "What to do first",
    "balance.do.front_sag": "Bring the front's sag to its target",
    "balance.do.rear_sag": "Bring the rear's sag to its target",
    "balance.do.frequency": "Bring the ends' frequencies together",
    "balance.do.damping": "Bring the ends' rebound together",
    "balance.do.measure_sag": "Measure sag at both ends",
    "balance.do.measure_rebound": "Measure rebound at both ends",
    "balance.do.measure_again": "Read again: the ± leaves it open",
    "balance.do.nothing": "Nothing: the ends go together",
    "balance.sag": "Sag",
    "balance.frequency": "Frequency, front over rear",
    "balance.damping": "Rebound damping, front over rear",
    "balance.unknown": "not measured",
    "balance.sag.on_target": "on target",
    "balance.sag.too_little": "too little",
    "balance.sag.too_much": "too much",
    "balance.sag.unclear": "about at the edge",
    "balance.is.balanced": "they go together",
    "balance.is.front_higher": "the front is stiffer for its load",
    "balance.is.rear_higher": "the rear is stiffer for its load",
    "balance.is.unclear": "the ± leaves it open",
    "balance.damped.balanced": "they go together",
    "balance.damped.front_higher": "the front is damped more",
    "balance.damped.rear_higher": "the rear is damped more",
    "balance.damped.unclear": "the ± leaves it open",
    "balance.practice": (
        "Bands are common practice: frequency 1.0 to 1.3, damping 0.75 to 1.35, front over rear."
    ),
    # About
    "about.title": "About and cautions",
    "about.cautions": "Cautions",
    "about.caution.pressure": "Never exceed the pressure printed on the unit.",
    "about.caution.air": "Release all air before opening anything.",
    "about.caution.manual": "The maker's manual and local rules go before what this app says.",
    "about.caution.damage": (
        "A leaking, knocking or damaged unit, or a frame out of true, goes to a qualified "
        "mechanic and is not ridden."
    ),
    "about.caution.test": (
        "Bounce-test on level ground with someone holding the bike. For sag: full kit, brakes off."
    ),
    "about.caution.ride": "First ride after a change: slow, and on easy ground.",
    "about.privacy": "Nothing you enter leaves this device.",
    "about.notices": "Licences of the software inside",
}
