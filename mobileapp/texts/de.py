"""German."""

from typing import Final

TEXTS: Final = {
    "app.name": "Sag & Bounce",
    "app.loading": "Der Rechner macht sich bereit …",
    "back": "Zurück",
    "undo": "Rückgängig",
    "more": "mehr",
    "less": "weniger",
    "type": "{name} eintippen",
    "ok": "OK",
    "cancel": "Abbrechen",
    "stepper.more": "{name}: mehr",
    "stepper.less": "{name}: weniger",
    "input.not_a_number": "Das ist keine Zahl. Tippe Ziffern, etwa 27,5.",
    "offline.ready": "Offline bereit",
    "offline.preparing": (
        "Die App wird auf diesem Gerät abgelegt: {done} von {total} MB. Bleib im Netz."
    ),
    "offline.starting": "Die App wird auf diesem Gerät abgelegt. Bleib im Netz.",
    "offline.insecure": (
        "Unter dieser Adresse geht es nicht offline: Browser erlauben das nur mit https:// "
        "oder auf localhost."
    ),
    "offline.unsupported": (
        "Dieser Browser kann die App hier nicht offline behalten. Vielleicht ist es ein "
        "privates Fenster."
    ),
    "offline.full": "Nicht offline bereit: Das Gerät ist voll. Schaff Platz und lade neu.",
    "offline.network": (
        "Nicht offline bereit: Die Verbindung riss ab. Neu laden setzt dort fort, wo es aufhörte."
    ),
    "offline.error": (
        "Nicht offline bereit: Der Browser weigert sich. Lade neu, oder nimm einen anderen."
    ),
    "update.waits": "Eine neue Version ist da.",
    "update.apply": "Aktualisieren",
    "record.damaged": (
        "Ein gespeichertes Setup ist beschädigt und nicht lesbar. Es blieb, wie es ist."
    ),
    "record.newer": (
        "Ein gespeichertes Setup stammt von einer neueren Version der App. Es blieb, wie es ist."
    ),
    "store.full": (
        "Nicht gespeichert: Das Gerät ist voll. Schaff Platz, dann ändere einen Wert noch einmal."
    ),
    "store.failed": (
        "Nicht gespeichert: Der Browser weigert sich. Notiere die Werte, dann lade neu."
    ),
    "home.title": "Sag & Bounce",
    "home.sag": "Sag messen",
    "home.bounce": "Wippen stoppen",
    "home.saved": "Gespeicherte Setups",
    "home.none": "Noch nichts gespeichert. Jede Ablesung wird sofort gesichert.",
    "home.open": "{label} öffnen",
    "home.delete": "{label} löschen",
    "home.deleted": "„{label}“ gelöscht",
    "home.about": "Über die App, Vorsicht",
    "setup.unnamed": "Setup vom {when}",
    "settings.title": "Einstellungen",
    "settings.units": "Einheiten",
    "settings.units.mixed": "gemischt",
    "settings.units.metric": "metrisch",
    "settings.units.imperial": "Zoll",
    "settings.about.mixed": "mm, kg, km/h, und psi der Pumpe und lbf/in der Feder.",
    "settings.about.metric": "mm, kg, km/h, bar, N/mm.",
    "settings.about.imperial": "in, lb, mph, psi, lbf/in.",
    "settings.appearance": "Aussehen",
    "settings.appearance.sun": "Sonne",
    "settings.appearance.dark": "dunkel",
    "settings.appearance.auto": "auto",
    "settings.language": "Sprache",
    "settings.language.auto": "auto",
    "sag.title": "Sag",
    "sag.front": "Vorn",
    "sag.rear": "Hinten",
    "sag.travel.fork": "Federweg der Gabel",
    "sag.travel.shaft": "Hub des Dämpfers",
    "sag.travel.wheel": "Federweg am Rad",
    "sag.reading": "Sag abgelesen",
    "sag.place": "Abgelesen",
    "sag.place.shaft": "am Dämpfer",
    "sag.place.wheel": "am Rad",
    "sag.wheel_travel": "Federweg am Rad",
    "sag.how": (
        "Volle Ausrüstung, Fahrhaltung, Bremsen offen. O-Ring an die Dichtung schieben, sanft "
        "einsinken, absteigen, ablesen, wie weit der O-Ring gewandert ist."
    ),
    "sag.frequency": "Wippt mit etwa",
    "sag.frequency.unknown": "Mit dem Federweg am Rad zeigt sich die Frequenz dazu.",
    "sag.frequency.too_small": (
        "So wenig Sag lässt sich nicht genau genug für eine Frequenz ablesen."
    ),
    "sag.band": "üblich {low} bis {high} %",
    "sag.band.within": "im üblichen Bereich, {low} bis {high} %",
    "sag.band.below": "unter den üblichen {low} bis {high} %: straffer als die meisten fahren",
    "sag.band.above": "über den üblichen {low} bis {high} %: weicher als die meisten fahren",
    "sag.band.open": "etwa am Rand der üblichen {low} bis {high} %; lies noch einmal ab",
    "sag.maker": "Allgemeine Praxis; die Angabe des Herstellers geht vor.",
    "sag.error.travel": "Der Federweg muss größer als null sein.",
    "sag.error.zero": "Noch kein Sag. Stell ein, wie weit der O-Ring gewandert ist.",
    "sag.error.negative": "Sag kann nicht unter null liegen.",
    "sag.error.beyond": (
        "Sag kann den vollen Federweg von {travel} nicht erreichen. Stimmt der Federweg? "
        "Dämpfer oder Rad?"
    ),
    "sag.unusual": "Außerhalb dessen, was gefahren wird; prüfe Einheit und Ablesestelle.",
    "sag.picture.front": "Von der Dichtung der Gabel bis zum O-Ring auf dem Rohr ablesen.",
    "sag.picture.rear": "Von der Dichtung des Dämpfers bis zum O-Ring auf der Stange ablesen.",
    "sag.gauge": "{end}: Sag {percent}. {band}",
    "sag.next": "Wippen stoppen",
    "bounce.title": "Wippen",
    "bounce.pad": "Tippe an jedem tiefsten Punkt",
    "bounce.pad.first": "Jemand hält das Rad, der Fahrer wippt und überlässt dem Rad den "
    "Rhythmus. Tippe hier jedes Mal, wenn es am tiefsten ist.",
    "bounce.picture": "Das Wippen über der Zeit, mit einem Tipper an jedem tiefsten Punkt.",
    "bounce.again": "Neu anfangen",
    "bounce.finish": "Fertig",
    "bounce.keep_going": "Weiter so",
    "bounce.done": "Fertig. Gespeichert.",
    "bounce.start_again": "Neu anfangen",
    "bounce.kept": "Gespeichert, wie es ist.",
    "bounce.keep": "Sichern",
    "bounce.beats": "Bisher: {counts}",
    "bounce.beats.used": "{count} verwendet",
    "bounce.beats.warm_up": "{count} zum Einschwingen",
    "bounce.beats.missed": "{count} verpasst",
    "bounce.beats.doubled": "{count} doppelt",
    "bounce.beats.outlier": "{count} daneben",
    "bounce.every": "Tippen bei",
    "bounce.every.1": "jedem Tiefpunkt",
    "bounce.every.2": "jedem zweiten",
    "bounce.pad.2": "Tippe an jedem zweiten tiefsten Punkt",
    "core.bounce_few_taps": "Tippe an jedem tiefsten Punkt.",
    "core.bounce_more_taps": "Bisher gleichmäßig: noch {more} Tipper.",
    "core.bounce_wide": "Noch ein paar Tipper, dann ist es sicher.",
    "core.bounce_unclear": "Unklar, welcher Tipper zu welchem Tiefpunkt gehört: jeden einmal.",
    "core.bounce_no_rhythm_yet": "Noch kein klarer Rhythmus: überlass ihn dem Rad.",
    "core.bounce_restart": "Da war eine Pause: gezählt wird ab dem Neubeginn.",
    "core.bounce_done": "Das genügt.",
    "core.bounce_unsteady": (
        "Die Tipper haben keinen festen Rhythmus: überlass ihn dem Rad, dann neu anfangen."
    ),
    "core.bounce_accidents": (
        "Zu viele verpasst oder doppelt: neu anfangen, an jedem Tiefpunkt einmal tippen."
    ),
    "core.bounce_frequency": ("So wippt kein Rad: an jedem Tiefpunkt tippen, und neu anfangen."),
    "core.bounce_no_success": "Dreißig Tipper und noch unsicher: ausruhen, dann neu anfangen.",
    "bounce.no_clock": "Der Browser nennt hier keine genauen Zeiten, das ± ist darum weiter.",
    "bounce.rhythm": (
        "Das ist der Rhythmus des Fahrers. Er kann bis zu ein Zehntel neben dem des Rads liegen."
    ),
    "steps": "Weiter mit",
    "steps.sag": "Sag",
    "steps.bounce": "Wippen",
    "steps.rebound": "Zugstufe",
    "steps.trail": "Strecke",
    "steps.balance": "Balance",
    "rebound.title": "Zugstufe",
    "rebound.how": (
        "Fahrer auf dem Rad, Bremsen offen, ebener Boden. Den Sag markieren. Deutlich unter die "
        "Marke drücken, plötzlich loslassen, und zusehen, wie es zurückkommt."
    ),
    "rebound.end": "Welches Ende",
    "rebound.way": "Überschwung, gelesen am",
    "rebound.way.ruler": "Maß",
    "rebound.way.film": "Film",
    "rebound.way.not_passed": "keiner",
    "rebound.push": "Gedrückt, unter die Sag-Marke",
    "rebound.overshoot": "Überschwung, über die Sag-Marke",
    "rebound.frames": "Vom Loslassen bis durch die Marke",
    "rebound.rate": "Bilder der Kamera in der Sekunde",
    "rebound.not_passed": "Es kroch zur Sag-Marke zurück und ging nicht durch.",
    "rebound.hand": (
        "Eine Stoppuhr in der Hand kann das nicht: Ihr ± wäre so breit wie die ganze Skala."
    ),
    "rebound.clicks": "Zugstufe, geöffnet von ganz zu",
    "rebound.picture": (
        "Das Rad über der Zeit: vom Druck hinauf durch die Sag-Marke, darüber und zurück."
    ),
    "rebound.missing.frames": (
        "Noch keine Bilder. Zähle sie vom Loslassen bis zum Durchgang durch die Marke."
    ),
    "rebound.missing.frequency": (
        "Ein Film braucht die Frequenz dieses Endes: erst Sag messen oder Wippen stoppen."
    ),
    "rebound.missing.push": "Noch kein Druck. Stell ein, wie weit unter der Marke es losging.",
    "rebound.missing.overshoot": (
        "Noch kein Überschwung. Stell ein, wie weit es über die Marke ging, oder wähle „keiner“."
    ),
    "rebound.damping": "Dämpfungsgrad",
    "rebound.at_least": "mindestens {ratio}",
    "rebound.scale.low": "springt",
    "rebound.scale.high": "kriecht",
    "rebound.scale": "Dämpfungsgrad {ratio}; einmal überschwingen, dann Ruhe, ist 0,35 bis 0,6.",
    "rebound.turn.close": "Zugstufe zu: mehr Dämpfung",
    "rebound.turn.open": "Zugstufe auf: weniger Dämpfung",
    "rebound.turn.keep": "So lassen: einmal überschwingen, dann Ruhe",
    "rebound.turn.measure": "Langsam genug, vielleicht zu langsam: zwei Klicks auf, neu ablesen",
    "rebound.sure": "Das ± lässt keinen Zweifel.",
    "rebound.unsure": "Im Rahmen des ± kann es anders sein: noch einmal ablesen.",
    "rebound.settled": "Das Schwingen des Rads schrumpft auf ein Drittel in {time}.",
    "rebound.returned": "Zwei Drittel zurück ist das Laufrad nach {time}.",
    "rebound.again": "Verstellt: neu ablesen",
    "rebound.tries": "Ablesung {count} an diesem Ende",
    "rebound.clicks.keep": (
        "Nach den beiden Einstellungen passen {clicks} Klicks von ganz zu: so lassen."
    ),
    "rebound.clicks.open": (
        "Nach den beiden Einstellungen: {turn} auf, bis {clicks} Klicks von ganz zu."
    ),
    "rebound.clicks.close": (
        "Nach den beiden Einstellungen: {turn} zu, bis {clicks} Klicks von ganz zu."
    ),
    "trail.title": "Strecke",
    "trail.how": (
        "Die wiederkehrenden Wellen des Tages: Bremswellen, Wurzeln, Rippen. Den Abstand von "
        "Kamm zu Kamm abschreiten, die Höhe vom Tal zum Kamm schätzen."
    ),
    "trail.slowest": "Langsamste Fahrt darüber",
    "trail.fastest": "Schnellste Fahrt darüber",
    "trail.bump": "Wellen {count}",
    "trail.spacing": "Abstand",
    "trail.height": "Höhe",
    "trail.add": "Auch andere Wellen",
    "trail.remove": "Wellen {count} entfernen",
    "trail.numbers": "Zahlen",
    "trail.at": "bei {speed}",
    "trail.missing.zero": "Abstand, Höhe und Geschwindigkeit müssen größer als null sein.",
    "trail.missing.order": "Die schnellste Fahrt muss schneller sein als die langsamste.",
    "trail.missing.frequency": (
        "Das braucht die Frequenz des Rads: erst Sag messen oder Wippen stoppen."
    ),
    "trail.says.follows_follows": (
        "{end}: geht mit diesen Wellen auf und ab; am stärksten schaukeln sie bei {resonant}."
    ),
    "trail.says.follows_resonates": (
        "{end}: diese Wellen schaukeln am stärksten bei {resonant}, und so schnell fährst du."
    ),
    "trail.says.follows_filters": (
        "{end}: um {resonant} schaukeln diese Wellen; über {filtering} werden sie geglättet."
    ),
    "trail.says.resonates_resonates": (
        "{end}: bei diesem Tempo schaukeln die Wellen am stärksten. Erst über {filtering} werden "
        "sie geglättet."
    ),
    "trail.says.resonates_filters": (
        "{end}: langsam, nahe {resonant}, schaukeln die Wellen; über {filtering} werden sie "
        "geglättet."
    ),
    "trail.says.filters_filters": (
        "{end}: glättet diese Wellen bei jedem dieser Tempi; {percent} % kommen bei {fast} durch."
    ),
    "trail.lifts": "Ab {speed} kommt das Laufrad nicht mehr nach und hebt ab.",
    "trail.assumed.rebound": "Die Zugdämpfung ist angenommen wie üblich: miss sie.",
    "trail.assumed.compression": "Die Druckdämpfung ist angenommen: zwei Fünftel der Zugdämpfung.",
    "trail.row.forcing": "Wellen in der Sekunde",
    "trail.row.through": "Kommt durch",
    "trail.row.drop": "Fährt tiefer um",
    "trail.row.recovered": "Zurück vor der nächsten Welle",
    "trail.row.packed": "Bleibt unten, vom Hub",
    "trail.row.stroke": "Hub auf und ab vom Sag",
    "trail.row.wheel_speed": "Tempo des Laufrads, Spitze",
    "trail.row.wheel_acceleration": "Beschleunigung des Laufrads, Spitze",
    "trail.row.shaft_speed": "Tempo der Stange, Spitze",
    "trail.row.circuit": "Dämpfung, die arbeitet",
    "trail.row.contact": "Kleinste Last am Boden",
    "trail.circuit.low": "langsame",
    "trail.circuit.crossover": "beide",
    "trail.circuit.high": "schnelle",
    "trail.chart": (
        "Wie viel von den Wellen bei welchem Tempo durchkommt. Die Tempi des Tages liegen "
        "zwischen den senkrechten Linien; bei 100 % wird nichts geglättet."
    ),
    "balance.title": "Balance",
    "balance.first": "Was zuerst kommt",
    "balance.do.front_sag": "Den Sag vorn ins Ziel bringen",
    "balance.do.rear_sag": "Den Sag hinten ins Ziel bringen",
    "balance.do.frequency": "Die Frequenzen der Enden zusammenbringen",
    "balance.do.damping": "Die Zugstufen der Enden zusammenbringen",
    "balance.do.measure_sag": "Sag an beiden Enden messen",
    "balance.do.measure_rebound": "Zugstufe an beiden Enden messen",
    "balance.do.measure_again": "Noch einmal ablesen: das ± lässt es offen",
    "balance.do.nothing": "Nichts: die Enden passen zusammen",
    "balance.sag": "Sag",
    "balance.frequency": "Frequenz, vorn durch hinten",
    "balance.damping": "Zugdämpfung, vorn durch hinten",
    "balance.unknown": "nicht gemessen",
    "balance.sag.on_target": "im Ziel",
    "balance.sag.too_little": "zu wenig",
    "balance.sag.too_much": "zu viel",
    "balance.sag.unclear": "etwa am Rand",
    "balance.is.balanced": "sie passen zusammen",
    "balance.is.front_higher": "vorn ist straffer für seine Last",
    "balance.is.rear_higher": "hinten ist straffer für seine Last",
    "balance.is.unclear": "das ± lässt es offen",
    "balance.damped.balanced": "sie passen zusammen",
    "balance.damped.front_higher": "vorn ist stärker gedämpft",
    "balance.damped.rear_higher": "hinten ist stärker gedämpft",
    "balance.damped.unclear": "das ± lässt es offen",
    "balance.practice": (
        "Die Bereiche sind allgemeine Praxis: Frequenz 1,0 bis 1,3, Dämpfung 0,75 bis 1,35, vorn "
        "durch hinten."
    ),
    "about.title": "Über die App, Vorsicht",
    "about.cautions": "Vorsicht",
    "about.caution.pressure": "Nie über den Druck gehen, der auf dem Bauteil steht.",
    "about.caution.air": "Alle Luft ablassen, bevor etwas geöffnet wird.",
    "about.caution.manual": (
        "Die Anleitung des Herstellers und örtliche Regeln gehen dem vor, was diese App sagt."
    ),
    "about.caution.damage": (
        "Ein undichtes, klopfendes oder beschädigtes Bauteil oder ein verzogener Rahmen gehört "
        "in eine Fachwerkstatt und wird nicht gefahren."
    ),
    "about.caution.test": (
        "Wippen nur auf ebenem Boden, jemand hält das Rad. Für den Sag: volle Ausrüstung, "
        "Bremsen offen."
    ),
    "about.caution.ride": "Erste Fahrt nach einer Änderung: langsam und auf leichtem Grund.",
    "about.privacy": "Nichts, was du eingibst, verlässt dieses Gerät.",
    "about.notices": "Lizenzen der enthaltenen Software",
}
