<?xml version="1.0" encoding="utf-8"?>
<!DOCTYPE TS>
<TS version="2.1" language="de" sourcelanguage="en">
<context>
    <name>DesignWish</name>
    <message>
        <source>Lift phase</source>
        <translation>Phase heben</translation>
    </message>
    <message>
        <source>Hold low frequency</source>
        <translation>Tiefe Frequenzen halten</translation>
    </message>
    <message>
        <source>Gain for error</source>
        <translation>Verstärkung für Abweichung</translation>
    </message>
    <message>
        <source>Quiet a resonance</source>
        <translation>Resonanz beruhigen</translation>
    </message>
    <message>
        <source>Roll off</source>
        <translation>Abfallen lassen</translation>
    </message>
    <message>
        <source>phase spent at crossover</source>
        <translation>Phase, am Durchtritt ausgegeben</translation>
    </message>
    <message>
        <source>largest error</source>
        <translation>größte Abweichung</translation>
    </message>
    <message>
        <source>wanted phase margin</source>
        <translation>gewünschte Phasenreserve</translation>
    </message>
    <message>
        <source>allowance</source>
        <translation>Zuschlag</translation>
    </message>
    <message>
        <source>crossover (empty: gain stays)</source>
        <translation>Durchtritt (leer: Verstärkung bleibt)</translation>
    </message>
    <message>
        <source>rejection</source>
        <translation>Unterdrückung</translation>
    </message>
    <message>
        <source>up to</source>
        <translation>bis</translation>
    </message>
    <message>
        <source>looked for from</source>
        <translation>gesucht ab</translation>
    </message>
    <message>
        <source>loop at every peak below</source>
        <translation>Kreis an jeder Spitze unter</translation>
    </message>
    <message>
        <source>from</source>
        <translation>ab</translation>
    </message>
    <message>
        <source>closed loop below</source>
        <translation>geschlossener Kreis unter</translation>
    </message>
    <message>
        <source>error after a step</source>
        <translation>Abweichung nach Sprung</translation>
    </message>
    <message>
        <source>error on a ramp</source>
        <translation>Abweichung bei Rampe</translation>
    </message>
    <message>
        <source>error on a parabola</source>
        <translation>Abweichung bei Parabel</translation>
    </message>
    <message>
        <source>for</source>
        <translation>für</translation>
    </message>
    <message>
        <source>disturbance rejection</source>
        <translation>Störunterdrückung</translation>
    </message>
    <message>
        <source>with</source>
        <translation>mit</translation>
    </message>
    <message>
        <source>one real pole</source>
        <translation>ein reeller Pol</translation>
    </message>
    <message>
        <source>a pair, damping 0.7</source>
        <translation>ein Paar, Dämpfung 0.7</translation>
    </message>
</context>
<context>
    <name>FleetFigures</name>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
</context>
<context>
    <name>FollowedPlace</name>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
</context>
<context>
    <name>MarginLabel</name>
    <message>
        <source>realised</source>
        <translation>verwirklicht</translation>
    </message>
</context>
<context>
    <name>MeasurementWords</name>
    <message>
        <source>%1 rows gave points</source>
        <translation>%1 Zeilen gaben Punkte</translation>
    </message>
    <message>
        <source>, none was skipped.</source>
        <translation>, keine wurde übergangen.</translation>
    </message>
    <message>
        <source>, %1 skipped, the first in line %2: %3.</source>
        <translation>, %1 übergangen, die erste in Zeile %2: %3.</translation>
    </message>
    <message>
        <source>Columns: %1.</source>
        <translation>Spalten: %1.</translation>
    </message>
    <message>
        <source>%1 more remarks of the reader.</source>
        <translation>%1 weitere Bemerkungen des Lesers.</translation>
    </message>
    <message>
        <source>This case is a model: nothing of it was measured.</source>
        <translation>Diese Strecke ist ein Modell: nichts davon wurde gemessen.</translation>
    </message>
    <message>
        <source>The file could not be read.</source>
        <translation>Die Datei ließ sich nicht lesen.</translation>
    </message>
    <message>
        <source>The file holds no coherence, so the random error is not known.</source>
        <translation>Die Datei enthält keine Kohärenz; der Zufallsfehler ist nicht bekannt.</translation>
    </message>
    <message>
        <source>The file does not say how many averages were taken, so the random error is not known.</source>
        <translation>Die Datei sagt nicht, wie oft gemittelt wurde; der Zufallsfehler ist nicht bekannt.</translation>
    </message>
    <message>
        <source>%1 averages.</source>
        <translation>%1 Mittelungen.</translation>
    </message>
    <message>
        <source>Fit of order %1, misfit %2.</source>
        <translation>Anpassung der Ordnung %1, Abweichung %2.</translation>
    </message>
    <message>
        <source>No model is fitted.</source>
        <translation>Kein Modell ist angepasst.</translation>
    </message>
</context>
<context>
    <name>VerdictChange</name>
    <message>
        <source>all met</source>
        <translation>alle erfüllt</translation>
    </message>
    <message>
        <source>%1 of %2 unmet</source>
        <translation>%1 von %2 verletzt</translation>
    </message>
    <message>
        <source>%1 of %2 not determined</source>
        <translation>%1 von %2 nicht bestimmt</translation>
    </message>
</context>
<context>
    <name>cautions</name>
    <message>
        <source>Closing a loop on real equipment can move, heat or energise it without warning.</source>
        <translation>Einen Regelkreis an einer echten Anlage zu schließen kann sie ohne Warnung bewegen, heizen oder unter Spannung setzen.</translation>
    </message>
    <message>
        <source>First close it with limited effort, an independent stop, and nobody in reach.</source>
        <translation>Zuerst mit begrenztem Stellaufwand schließen, mit unabhängigem Halt, und niemand in Reichweite.</translation>
    </message>
    <message>
        <source>These figures rest on the plant data given and say nothing of saturation, faults or what was not measured.</source>
        <translation>Diese Kennzahlen beruhen auf den gegebenen Daten der Strecke und sagen nichts von Sättigung, Fehlern oder dem, was nicht gemessen wurde.</translation>
    </message>
    <message>
        <source>Local codes, the machine&apos;s risk assessment and licensed practice decide.</source>
        <translation>Örtliche Vorschriften, die Risikobeurteilung der Maschine und zugelassene Fachleute entscheiden.</translation>
    </message>
</context>
<context>
    <name>cornerwright</name>
    <message>
        <source>%1 could not be loaded</source>
        <translation>%1 ließ sich nicht laden</translation>
    </message>
    <message>
        <source>%1 points</source>
        <translation>%1 Punkte</translation>
    </message>
    <message>
        <source>coherence ≥ %1</source>
        <translation>Kohärenz ≥ %1</translation>
    </message>
    <message>
        <source>no fit</source>
        <translation>keine Anpassung</translation>
    </message>
    <message>
        <source>model, order %1</source>
        <translation>Modell, Ordnung %1</translation>
    </message>
    <message>
        <source>dead time %1</source>
        <translation>Totzeit %1</translation>
    </message>
    <message>
        <source>binds 1 requirement</source>
        <translation>bestimmt 1 Anforderung</translation>
    </message>
    <message>
        <source>binds %1 requirements</source>
        <translation>bestimmt %1 Anforderungen</translation>
    </message>
    <message>
        <source>Fit: order %1, misfit %2, dead time %3</source>
        <translation>Anpassung: Ordnung %1, Abweichung %2, Totzeit %3</translation>
    </message>
    <message>
        <source>No fit: locus and step are not determined</source>
        <translation>Keine Anpassung: Ortskurve und Sprung nicht bestimmt</translation>
    </message>
    <message>
        <source>Sampled at %1, computation %2</source>
        <translation>Abgetastet mit %1, Rechenzeit %2</translation>
    </message>
    <message>
        <source>Costs %1 at the last crossover</source>
        <translation>Kostet %1 am letzten Durchtritt</translation>
    </message>
    <message>
        <source>centre</source>
        <translation>Mitte</translation>
    </message>
    <message>
        <source>depth</source>
        <translation>Tiefe</translation>
    </message>
    <message>
        <source>width ζ</source>
        <translation>Breite ζ</translation>
    </message>
    <message>
        <source>ratio %1 · lifts %2° at %3</source>
        <translation>Verhältnis %1 · hebt %2° bei %3</translation>
    </message>
    <message>
        <source>ratio %1 · lags %2° at %3</source>
        <translation>Verhältnis %1 · senkt %2° bei %3</translation>
    </message>
    <message>
        <source>Phase margin</source>
        <translation>Phasenreserve</translation>
    </message>
    <message>
        <source>Gain margin</source>
        <translation>Amplitudenreserve</translation>
    </message>
    <message>
        <source>Gain reduction margin</source>
        <translation>Absenkungsreserve</translation>
    </message>
    <message>
        <source>Delay margin</source>
        <translation>Totzeitreserve</translation>
    </message>
    <message>
        <source>Sensitivity peak</source>
        <translation>Empfindlichkeitsspitze</translation>
    </message>
    <message>
        <source>Complementary peak</source>
        <translation>Führungsspitze</translation>
    </message>
    <message>
        <source>Control effort peak</source>
        <translation>Stellaufwandsspitze</translation>
    </message>
    <message>
        <source>Bandwidth</source>
        <translation>Bandbreite</translation>
    </message>
    <message>
        <source>Rejection</source>
        <translation>Störunterdrückung</translation>
    </message>
    <message>
        <source>Roll-off</source>
        <translation>Abfall</translation>
    </message>
    <message>
        <source>Overshoot</source>
        <translation>Überschwingen</translation>
    </message>
    <message>
        <source>Peak time</source>
        <translation>Spitzenzeit</translation>
    </message>
    <message>
        <source>Rise time</source>
        <translation>Anstiegszeit</translation>
    </message>
    <message>
        <source>Settling time</source>
        <translation>Ausregelzeit</translation>
    </message>
    <message>
        <source>Steady-state error</source>
        <translation>Bleibende Abweichung</translation>
    </message>
    <message>
        <source>Control peak</source>
        <translation>Stellspitze</translation>
    </message>
    <message>
        <source>Disturbance peak</source>
        <translation>Störspitze</translation>
    </message>
    <message>
        <source>Settling time, %1 %</source>
        <translation>Ausregelzeit, %1 %</translation>
    </message>
    <message>
        <source>Rejection up to %1</source>
        <translation>Unterdrückung bis %1</translation>
    </message>
    <message>
        <source>Roll-off from %1</source>
        <translation>Abfall ab %1</translation>
    </message>
    <message>
        <source>Step error</source>
        <translation>Sprungabweichung</translation>
    </message>
    <message>
        <source>Ramp error</source>
        <translation>Rampenabweichung</translation>
    </message>
    <message>
        <source>Parabola error</source>
        <translation>Parabelabweichung</translation>
    </message>
    <message>
        <source>met</source>
        <translation>erfüllt</translation>
    </message>
    <message>
        <source>unmet</source>
        <translation>verletzt</translation>
    </message>
    <message>
        <source>not determined</source>
        <translation>nicht bestimmt</translation>
    </message>
    <message>
        <source>Gain</source>
        <translation>Verstärkung</translation>
    </message>
    <message>
        <source>Integrator</source>
        <translation>Integrierer</translation>
    </message>
    <message>
        <source>PI</source>
        <translation>PI-Glied</translation>
    </message>
    <message>
        <source>Lead</source>
        <translation>Lead-Glied</translation>
    </message>
    <message>
        <source>Lag</source>
        <translation>Lag-Glied</translation>
    </message>
    <message>
        <source>Real zero</source>
        <translation>Reelle Nullstelle</translation>
    </message>
    <message>
        <source>Low-pass, first order</source>
        <translation>Tiefpass 1. Ordnung</translation>
    </message>
    <message>
        <source>Complex zeros</source>
        <translation>Komplexe Nullstellen</translation>
    </message>
    <message>
        <source>Low-pass, second order</source>
        <translation>Tiefpass 2. Ordnung</translation>
    </message>
    <message>
        <source>Notch</source>
        <translation>Kerbfilter</translation>
    </message>
    <message>
        <source>Washout</source>
        <translation>Washout-Glied</translation>
    </message>
    <message>
        <source>gain</source>
        <translation>Verstärkung</translation>
    </message>
    <message>
        <source>corner</source>
        <translation>Ecke</translation>
    </message>
    <message>
        <source>zero</source>
        <translation>Nullstelle</translation>
    </message>
    <message>
        <source>pole</source>
        <translation>Pol</translation>
    </message>
    <message>
        <source>damping</source>
        <translation>Dämpfung</translation>
    </message>
    <message>
        <source>zero damping</source>
        <translation>Nullstellendämpfung</translation>
    </message>
    <message>
        <source>pole damping</source>
        <translation>Poldämpfung</translation>
    </message>
    <message>
        <source>%1 over</source>
        <translation>%1 drüber</translation>
    </message>
    <message>
        <source>%1 short</source>
        <translation>%1 fehlen</translation>
    </message>
    <message>
        <source>design</source>
        <translation>Entwurf</translation>
    </message>
    <message>
        <source>realised</source>
        <translation>verwirklicht</translation>
    </message>
    <message>
        <source>no requirements yet</source>
        <translation>noch keine Anforderungen</translation>
    </message>
    <message>
        <source>%1 of %2 unmet · worst: %3</source>
        <translation>%1 von %2 verletzt · zuerst: %3</translation>
    </message>
    <message>
        <source>%1 of %2 not determined</source>
        <translation>%1 von %2 nicht bestimmt</translation>
    </message>
    <message>
        <source>all %1 met · tightest: %2</source>
        <translation>alle %1 erfüllt · knappste: %2</translation>
    </message>
    <message>
        <source>Expected at least one limit, found none.</source>
        <translation>Mindestens eine Grenze erwartet, keine gefunden.</translation>
    </message>
    <message>
        <source>Expected the lower limit below the upper one.</source>
        <translation>Die untere Grenze wird unter der oberen erwartet.</translation>
    </message>
    <message>
        <source>Expected a limit above zero.</source>
        <translation>Eine Grenze über null erwartet.</translation>
    </message>
    <message>
        <source>Expected a frequency above zero.</source>
        <translation>Eine Frequenz über null erwartet.</translation>
    </message>
    <message>
        <source>Expected a band above zero.</source>
        <translation>Ein Band über null erwartet.</translation>
    </message>
    <message>
        <source>Expected no unit, found &quot;%1&quot;.</source>
        <translation>Keine Einheit erwartet, »%1« gefunden.</translation>
    </message>
    <message>
        <source>Expected a unit such as %1, found &quot;%2&quot;.</source>
        <translation>Eine Einheit wie %1 erwartet, »%2« gefunden.</translation>
    </message>
    <message>
        <source>Expected a number, found nothing.</source>
        <translation>Eine Zahl erwartet, nichts gefunden.</translation>
    </message>
    <message>
        <source>Expected a number, found &quot;%1&quot;.</source>
        <translation>Eine Zahl erwartet, »%1« gefunden.</translation>
    </message>
    <message>
        <source>%1 is no usable value here.</source>
        <translation>%1 ist hier kein brauchbarer Wert.</translation>
    </message>
    <message>
        <source>none</source>
        <translation>keine</translation>
    </message>
    <message>
        <source>Order %1, misfit %2</source>
        <translation>Ordnung %1, Abweichung %2</translation>
    </message>
    <message>
        <source>Dead time %1</source>
        <translation>Totzeit %1</translation>
    </message>
    <message>
        <source>Poles (rad/s): %1</source>
        <translation>Pole (rad/s): %1</translation>
    </message>
    <message>
        <source>Zeros (rad/s): %1</source>
        <translation>Nullstellen (rad/s): %1</translation>
    </message>
    <message>
        <source>%1 poles right of the axis: the case must declare as many unstable poles</source>
        <translation>%1 Pole rechts der Achse: die Strecke muss ebenso viele instabile Pole angeben</translation>
    </message>
    <message>
        <source>, %1</source>
        <translation>, %1</translation>
    </message>
    <message>
        <source>Column %1 “%2”: %3%4</source>
        <translation>Spalte %1 »%2«: %3%4</translation>
    </message>
    <message>
        <source>%1 rows used, %2 left out</source>
        <translation>%1 Zeilen benutzt, %2 ausgelassen</translation>
    </message>
    <message>
        <source>… and more</source>
        <translation>… und mehr</translation>
    </message>
    <message>
        <source>Line %1 left out: %2</source>
        <translation>Zeile %1 ausgelassen: %2</translation>
    </message>
    <message>
        <source>Choose the column of the excitation and that of the response.</source>
        <translation>Die Spalte der Anregung und die der Antwort wählen.</translation>
    </message>
    <message>
        <source>Excitation “%1”, response “%2”</source>
        <translation>Anregung »%1«, Antwort »%2«</translation>
    </message>
    <message>
        <source>%1 samples, one every %2</source>
        <translation>%1 Abtastwerte, alle %2 einer</translation>
    </message>
    <message>
        <source>%1 frequencies, %2 averages</source>
        <translation>%1 Frequenzen, %2 Mittelungen</translation>
    </message>
    <message>
        <source>plant P = L/(C H) from the measured loop gain L</source>
        <translation>Strecke P = L/(C H) aus der gemessenen Kreisverstärkung L</translation>
    </message>
    <message>
        <source>plant P = T/(C H (1 - T)) from the measured closed loop T</source>
        <translation>Strecke P = T/(C H (1 - T)) aus dem gemessenen geschlossenen Kreis T</translation>
    </message>
    <message>
        <source>compensator C: gain %1; zeros (rad/s): %2; poles (rad/s): %3; H: hold and delay of the design loop</source>
        <translation>Regler C: Verstärkung %1; Nullstellen (rad/s): %2; Pole (rad/s): %3; H: Halteglied und Totzeit des Entwurfskreises</translation>
    </message>
    <message>
        <source>taken from %1, SHA-256 %2</source>
        <translation>genommen aus %1, SHA-256 %2</translation>
    </message>
    <message>
        <source>column %1 taken as %2 %3</source>
        <translation>Spalte %1 als %2 %3 genommen</translation>
    </message>
    <message>
        <source>network parameter %1</source>
        <translation>Netzwerkparameter %1</translation>
    </message>
    <message>
        <source>sign turned</source>
        <translation>Vorzeichen gedreht</translation>
    </message>
    <message>
        <source>delay of %1 s taken out</source>
        <translation>Totzeit von %1 s herausgenommen</translation>
    </message>
    <message>
        <source>small</source>
        <comment>how nouns start inside a sentence: translate to small or large</comment>
        <translation>large</translation>
    </message>
    <message>
        <source>%1 points have a coherence below %2</source>
        <translation>%1 Punkte haben eine Kohärenz unter %2</translation>
    </message>
    <message>
        <source>points with a coherence below %1 left out</source>
        <translation>Punkte mit einer Kohärenz unter %1 ausgelassen</translation>
    </message>
</context>
<context>
    <name>cornerwright::AboutPage</name>
    <message>
        <source>About Cornerwright</source>
        <translation>Über Cornerwright</translation>
    </message>
    <message>
        <source>version %1</source>
        <translation>Version %1</translation>
    </message>
    <message>
        <source>Back</source>
        <translation>Zurück</translation>
    </message>
    <message>
        <source>A workbench for closing feedback loops on real equipment: from a measured or modelled plant, over corners dragged into place, to the difference equation that the firmware runs, with every margin judged on every unit.</source>
        <translation>Eine Werkbank für Regelkreise an echten Anlagen: von der gemessenen oder modellierten Strecke über Ecken, die man an ihren Platz zieht, bis zur Differenzengleichung, die in der Firmware läuft, jede Reserve an jeder Einheit beurteilt.</translation>
    </message>
    <message>
        <source>Cautions</source>
        <translation>Vorsicht</translation>
    </message>
    <message>
        <source>Licence</source>
        <translation>Lizenz</translation>
    </message>
    <message>
        <source>Free software under the GNU General Public License, version 3 or later. There is no warranty, to the extent permitted by law.</source>
        <translation>Freie Software unter der GNU General Public License, Version 3 oder später. Ohne Gewähr, soweit das Gesetz es erlaubt.</translation>
    </message>
</context>
<context>
    <name>cornerwright::BodePane</name>
    <message>
        <source>loop</source>
        <translation>Kreis</translation>
    </message>
    <message>
        <source>realised</source>
        <translation>verwirklicht</translation>
    </message>
    <message>
        <source>plant</source>
        <translation>Strecke</translation>
    </message>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
    <message>
        <source>other cases</source>
        <translation>andere Strecken</translation>
    </message>
    <message>
        <source>trial</source>
        <translation>Versuch</translation>
    </message>
    <message>
        <source>zero of %1</source>
        <translation>Nullstelle von %1</translation>
    </message>
    <message>
        <source>pole of %1</source>
        <translation>Pol von %1</translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation>Grenze von %1</translation>
    </message>
    <message>
        <source>case</source>
        <translation>Strecke</translation>
    </message>
</context>
<context>
    <name>cornerwright::CaseRow</name>
    <message>
        <source>Name of the case</source>
        <translation>Name der Strecke</translation>
    </message>
    <message>
        <source>Plant case %1, shown</source>
        <translation>Strecke %1, gezeigt</translation>
    </message>
    <message>
        <source>Plant case %1</source>
        <translation>Strecke %1</translation>
    </message>
    <message>
        <source>Draw %1</source>
        <translation>%1 zeichnen</translation>
    </message>
    <message>
        <source>Draw the curves of %1 (it is judged all the same)</source>
        <translation>Die Kurven von %1 zeichnen (beurteilt wird die Strecke in jedem Fall)</translation>
    </message>
    <message>
        <source>Show this case	Enter</source>
        <translation>Diese Strecke zeigen	Eingabe</translation>
    </message>
    <message>
        <source>Do not draw it	Space</source>
        <translation>Nicht zeichnen	Leertaste</translation>
    </message>
    <message>
        <source>Draw it	Space</source>
        <translation>Zeichnen	Leertaste</translation>
    </message>
    <message>
        <source>Rename	F2</source>
        <translation>Umbenennen	F2</translation>
    </message>
    <message>
        <source>Remove	Del</source>
        <translation>Wegnehmen	Entf</translation>
    </message>
    <message>
        <source>Fit a model	F</source>
        <translation>Modell anpassen	F</translation>
    </message>
</context>
<context>
    <name>cornerwright::CasesPanel</name>
    <message>
        <source>Plant cases</source>
        <translation>Strecken</translation>
    </message>
    <message>
        <source>+ formula</source>
        <translation>+ Formel</translation>
    </message>
    <message>
        <source>Add a plant case from a formula</source>
        <translation>Eine Strecke aus einer Formel hinzufügen</translation>
    </message>
    <message>
        <source>+ measurement</source>
        <translation>+ Messung</translation>
    </message>
    <message>
        <source>Add plant cases from measurement files</source>
        <translation>Strecken aus Messdateien hinzufügen</translation>
    </message>
    <message>
        <source>Add case %1</source>
        <translation>Strecke %1 hinzufügen</translation>
    </message>
    <message>
        <source>Rename case %1</source>
        <translation>Strecke %1 umbenennen</translation>
    </message>
    <message>
        <source>Remove case %1</source>
        <translation>Strecke %1 wegnehmen</translation>
    </message>
    <message>
        <source>No plant yet: add a measurement or a formula.</source>
        <translation>Noch keine Strecke: eine Messung oder Formel hinzufügen.</translation>
    </message>
    <message>
        <source>fit a model</source>
        <translation>anpassen</translation>
    </message>
    <message>
        <source>Fit a model to the shown case</source>
        <translation>Der gezeigten Strecke ein Modell anpassen</translation>
    </message>
</context>
<context>
    <name>cornerwright::ChainPanel</name>
    <message>
        <source>Chain</source>
        <translation>Kette</translation>
    </message>
    <message>
        <source>+ add section</source>
        <translation>+ Glied</translation>
    </message>
    <message>
        <source>Add section</source>
        <translation>Glied hinzufügen</translation>
    </message>
    <message>
        <source>Sections</source>
        <translation>Glieder</translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation>%1 hinzufügen</translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation>%1 wegnehmen</translation>
    </message>
    <message>
        <source>Move %1</source>
        <translation>%1 bewegen</translation>
    </message>
    <message>
        <source>design</source>
        <translation>Entwurf</translation>
    </message>
    <message>
        <source>Section design</source>
        <translation>Gliedentwurf</translation>
    </message>
    <message>
        <source>Sections worked out from what is wanted</source>
        <translation>Glieder, ausgerechnet aus dem, was gewünscht ist</translation>
    </message>
</context>
<context>
    <name>cornerwright::ColumnTable</name>
    <message>
        <source>Frequency</source>
        <translation>Frequenz</translation>
    </message>
    <message>
        <source>Magnitude</source>
        <translation>Betrag</translation>
    </message>
    <message>
        <source>Phase</source>
        <translation>Phase</translation>
    </message>
    <message>
        <source>Real part</source>
        <translation>Realteil</translation>
    </message>
    <message>
        <source>Imaginary part</source>
        <translation>Imaginärteil</translation>
    </message>
    <message>
        <source>Coherence</source>
        <translation>Kohärenz</translation>
    </message>
    <message>
        <source>Not used</source>
        <translation>nicht benutzt</translation>
    </message>
    <message>
        <source>The file as it stands, and what each column means</source>
        <translation>Die Datei, wie sie ist, und was jede Spalte bedeutet</translation>
    </message>
    <message>
        <source>Column %1</source>
        <translation>Spalte %1</translation>
    </message>
    <message>
        <source>means</source>
        <translation>bedeutet</translation>
    </message>
    <message>
        <source>in</source>
        <translation>in</translation>
    </message>
    <message>
        <source>What column %1 means</source>
        <translation>Was Spalte %1 bedeutet</translation>
    </message>
    <message>
        <source>Unit of column %1</source>
        <translation>Einheit von Spalte %1</translation>
    </message>
    <message>
        <source>? choose</source>
        <translation>? wählen</translation>
    </message>
    <message>
        <source>as the heading says</source>
        <translation>wie die Überschrift sagt</translation>
    </message>
</context>
<context>
    <name>cornerwright::DesignCommands</name>
    <message>
        <source>One or two leads so that every case has the wanted phase margin</source>
        <translation>Ein oder zwei Lead-Glieder, damit jede Strecke die gewünschte Phasenreserve hat</translation>
    </message>
    <message>
        <source>A lag or PI section for the error or rejection wanted</source>
        <translation>Ein Lag- oder PI-Glied für die gewünschte Abweichung oder Unterdrückung</translation>
    </message>
    <message>
        <source>The gain for the steady-state error wanted</source>
        <translation>Die Verstärkung für die gewünschte bleibende Abweichung</translation>
    </message>
    <message>
        <source>A notch wide enough for the resonance of every case</source>
        <translation>Ein Kerbfilter, breit genug für die Resonanz jeder Strecke</translation>
    </message>
    <message>
        <source>Poles for the attenuation wanted at high frequencies</source>
        <translation>Pole für die gewünschte Dämpfung bei hohen Frequenzen</translation>
    </message>
    <message>
        <source>%1 …</source>
        <translation>%1 …</translation>
    </message>
    <message>
        <source>&amp;Room to move</source>
        <translation>Bewegungs&amp;raum</translation>
    </message>
    <message>
        <source>&amp;Tolerance run</source>
        <translation>&amp;Toleranzlauf</translation>
    </message>
    <message>
        <source>Judge a &amp;fleet</source>
        <translation>Eine &amp;Flotte beurteilen</translation>
    </message>
    <message>
        <source>How far each value may move before a requirement fails</source>
        <translation>Wie weit jeder Wert sich bewegen darf, bevor eine Anforderung verletzt wird</translation>
    </message>
    <message>
        <source>Yield under spreads of plant and components</source>
        <translation>Ausbeute bei Streuung von Strecke und Bauteilen</translation>
    </message>
    <message>
        <source>Every measured unit of a folder against this design</source>
        <translation>Jede gemessene Einheit eines Ordners gegen diesen Entwurf</translation>
    </message>
    <message>
        <source>Keep worst sample</source>
        <translation>Schlechteste Probe behalten</translation>
    </message>
</context>
<context>
    <name>cornerwright::DesignPanel</name>
    <message>
        <source>Take</source>
        <translation>Übernehmen</translation>
    </message>
    <message>
        <source>Leave</source>
        <translation>Lassen</translation>
    </message>
    <message>
        <source>Keep these sections as one step (Ctrl+Enter)</source>
        <translation>Diese Glieder als einen Schritt behalten (Strg+Eingabe)</translation>
    </message>
    <message>
        <source>Put everything back (Escape)</source>
        <translation>Alles zurücklegen (Esc)</translation>
    </message>
    <message>
        <source>Section design</source>
        <translation>Gliedentwurf</translation>
    </message>
    <message>
        <source>Working it out …</source>
        <translation>Wird ausgerechnet …</translation>
    </message>
</context>
<context>
    <name>cornerwright::Document</name>
    <message>
        <source>untitled</source>
        <translation>ohne Titel</translation>
    </message>
</context>
<context>
    <name>cornerwright::ExportRow</name>
    <message>
        <source>Name in the files</source>
        <translation>Name in den Dateien</translation>
    </message>
    <message>
        <source>C99</source>
        <translation>C99</translation>
    </message>
    <message>
        <source>Structured text</source>
        <translation>Strukturierter Text</translation>
    </message>
    <message>
        <source>JSON</source>
        <translation>JSON</translation>
    </message>
    <message>
        <source>CSV</source>
        <translation>CSV</translation>
    </message>
    <message>
        <source>Hand over as %1</source>
        <translation>Als %1 übergeben</translation>
    </message>
    <message>
        <source>Report</source>
        <translation>Bericht</translation>
    </message>
    <message>
        <source>Write the review report</source>
        <translation>Den Prüfbericht schreiben</translation>
    </message>
    <message>
        <source>✗ %1 of the requirements are unmet; every file will say so.</source>
        <translation>✗ %1 der Anforderungen sind verletzt; jede Datei wird es sagen.</translation>
    </message>
    <message>
        <source>? No requirement is stated; nothing was judged, and every file will say so.</source>
        <translation>? Keine Anforderung ist gestellt; nichts wurde beurteilt, und jede Datei wird es sagen.</translation>
    </message>
    <message>
        <source>? %1 of the requirements are not determined; every file will say so.</source>
        <translation>? %1 der Anforderungen sind nicht bestimmt; jede Datei wird es sagen.</translation>
    </message>
</context>
<context>
    <name>cornerwright::FileFlow</name>
    <message>
        <source>Save</source>
        <translation>Sichern</translation>
    </message>
    <message>
        <source>Discard changes</source>
        <translation>Änderungen verwerfen</translation>
    </message>
    <message>
        <source>Stay</source>
        <translation>Bleiben</translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before another project is opened?</source>
        <translation>%1 hat ungesicherte Änderungen. Vor dem Öffnen eines anderen Projekts sichern?</translation>
    </message>
    <message>
        <source>Open project</source>
        <translation>Projekt öffnen</translation>
    </message>
    <message>
        <source>Cornerwright projects (*%1);;All files (*)</source>
        <translation>Cornerwright-Projekte (*%1);;Alle Dateien (*)</translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before a new project is started?</source>
        <translation>%1 hat ungesicherte Änderungen. Vor einem neuen Projekt sichern?</translation>
    </message>
    <message>
        <source>Save project</source>
        <translation>Projekt sichern</translation>
    </message>
    <message>
        <source>Cornerwright projects (*%1)</source>
        <translation>Cornerwright-Projekte (*%1)</translation>
    </message>
    <message>
        <source>Add measurements</source>
        <translation>Messungen hinzufügen</translation>
    </message>
    <message>
        <source>Measurements (*.csv *.txt *.dat *.tsv *.s?p *.ts *.uff *.unv *.58);;All files (*)</source>
        <translation>Messungen (*.csv *.txt *.dat *.tsv *.s?p *.ts *.uff *.unv *.58);;Alle Dateien (*)</translation>
    </message>
    <message>
        <source>an unsaved project</source>
        <translation>ein ungesichertes Projekt</translation>
    </message>
    <message>
        <source>The program did not end in order last time. Unsaved changes of %1 from %2 were kept.</source>
        <translation>Das Programm endete letztes Mal nicht ordentlich. Ungesicherte Änderungen von %1 vom %2 wurden aufgehoben.</translation>
    </message>
    <message>
        <source>Recover</source>
        <translation>Wiederherstellen</translation>
    </message>
    <message>
        <source>Discard</source>
        <translation>Verwerfen</translation>
    </message>
    <message>
        <source>Accept changed measurements</source>
        <translation>Geänderte Messungen annehmen</translation>
    </message>
    <message>
        <source>Shall the project go by the measurement files as they are now?</source>
        <translation>Soll sich das Projekt nach den Messdateien richten, wie sie jetzt sind?</translation>
    </message>
    <message>
        <source>Ask again</source>
        <translation>Wieder fragen</translation>
    </message>
</context>
<context>
    <name>cornerwright::FitPanel</name>
    <message>
        <source>Fit a model</source>
        <translation>Modell anpassen</translation>
    </message>
    <message>
        <source>no poles right of the axis</source>
        <translation>keine Pole rechts der Achse</translation>
    </message>
    <message>
        <source>Take the model into the case</source>
        <translation>Modell in die Strecke übernehmen</translation>
    </message>
    <message>
        <source>stop</source>
        <translation>anhalten</translation>
    </message>
    <message>
        <source>back without a model</source>
        <translation>zurück ohne Modell</translation>
    </message>
    <message>
        <source>%1, fitting … %2 %</source>
        <translation>%1, Anpassung läuft … %2 %</translation>
    </message>
    <message>
        <source>found from the data</source>
        <translation>aus den Daten gefunden</translation>
    </message>
    <message>
        <source>none</source>
        <translation>keine</translation>
    </message>
    <message>
        <source>given</source>
        <translation>vorgegeben</translation>
    </message>
    <message>
        <source>a dead time is not negative</source>
        <translation>eine Totzeit ist nicht negativ</translation>
    </message>
    <message>
        <source>Order</source>
        <translation>Ordnung</translation>
    </message>
    <message>
        <source>Dead time</source>
        <translation>Totzeit</translation>
    </message>
    <message>
        <source>Seconds</source>
        <translation>Sekunden</translation>
    </message>
    <message>
        <source>Order of the model, 0: found from the data</source>
        <translation>Ordnung des Modells, 0: aus den Daten gefunden</translation>
    </message>
    <message>
        <source>Dead time of the model</source>
        <translation>Totzeit des Modells</translation>
    </message>
    <message>
        <source>Given dead time</source>
        <translation>Vorgegebene Totzeit</translation>
    </message>
    <message>
        <source>%1, fitting …</source>
        <translation>%1, Anpassung läuft …</translation>
    </message>
    <message>
        <source>Fit %1</source>
        <translation>%1 anpassen</translation>
    </message>
    <message>
        <source>%1 has a model of order %2 now, misfit %3. Root locus and step follow it.</source>
        <translation>%1 hat jetzt ein Modell der Ordnung %2, Abweichung %3. Wurzelortskurve und Sprung folgen ihm.</translation>
    </message>
</context>
<context>
    <name>cornerwright::FleetPane</name>
    <message>
        <source>no folder chosen</source>
        <translation>kein Ordner gewählt</translation>
    </message>
    <message>
        <source>Take as plant case</source>
        <translation>Als Strecke nehmen</translation>
    </message>
    <message>
        <source>Files that could not be read</source>
        <translation>Dateien, die sich nicht lesen ließen</translation>
    </message>
    <message>
        <source>Judge the fleet</source>
        <translation>Flotte beurteilen</translation>
    </message>
    <message>
        <source>Choose folder</source>
        <translation>Ordner wählen</translation>
    </message>
    <message>
        <source>Figure of the histogram</source>
        <translation>Kennzahl des Histogramms</translation>
    </message>
    <message>
        <source>Worst units</source>
        <translation>Schlechteste Einheiten</translation>
    </message>
    <message>
        <source>worst units</source>
        <translation>schlechteste Einheiten</translation>
    </message>
    <message>
        <source>requirement</source>
        <translation>Anforderung</translation>
    </message>
    <message>
        <source>headroom share</source>
        <translation>Spielraumanteil</translation>
    </message>
    <message>
        <source>Folder of measured units</source>
        <translation>Ordner mit gemessenen Einheiten</translation>
    </message>
    <message>
        <source>%1 units: %2 met, %3 unmet, %4 not determined, %5 unreadable</source>
        <translation>%1 Einheiten: %2 erfüllt, %3 verletzt, %4 nicht bestimmt, %5 unlesbar</translation>
    </message>
    <message>
        <source>of an earlier design</source>
        <translation>von einem früheren Entwurf</translation>
    </message>
    <message>
        <source>stopped: the units judged so far</source>
        <translation>angehalten: die bisher beurteilten Einheiten</translation>
    </message>
    <message>
        <source>Fleet</source>
        <translation>Flotte</translation>
    </message>
</context>
<context>
    <name>cornerwright::FormulaEntry</name>
    <message>
        <source>name</source>
        <translation>Name</translation>
    </message>
    <message>
        <source>Name of the new case</source>
        <translation>Name der neuen Strecke</translation>
    </message>
    <message>
        <source>such as 42 exp(-0.0008 s) / (s (s/31 + 1))</source>
        <translation>etwa 42 exp(-0.0008 s) / (s (s/31 + 1))</translation>
    </message>
    <message>
        <source>Plant as a formula in s</source>
        <translation>Strecke als Formel in s</translation>
    </message>
    <message>
        <source>Add</source>
        <translation>Hinzufügen</translation>
    </message>
    <message>
        <source>Cancel</source>
        <translation>Abbrechen</translation>
    </message>
    <message>
        <source>model</source>
        <translation>Modell</translation>
    </message>
</context>
<context>
    <name>cornerwright::HandoverFlow</name>
    <message>
        <source>Folder for the handover</source>
        <translation>Ordner für die Übergabe</translation>
    </message>
    <message>
        <source>Written to %1: %2.</source>
        <translation>Nach %1 geschrieben: %2.</translation>
    </message>
    <message>
        <source>Write the review report</source>
        <translation>Den Prüfbericht schreiben</translation>
    </message>
    <message>
        <source>Report written to %1.</source>
        <translation>Bericht nach %1 geschrieben.</translation>
    </message>
    <message>
        <source>HTML (*.html);;PDF (*.pdf)</source>
        <translation>HTML (*.html);;PDF (*.pdf)</translation>
    </message>
</context>
<context>
    <name>cornerwright::HelpPanel</name>
    <message>
        <source>Help</source>
        <translation>Hilfe</translation>
    </message>
    <message>
        <source>Close the help</source>
        <translation>Hilfe schließen</translation>
    </message>
    <message>
        <source>Help text</source>
        <translation>Hilfetext</translation>
    </message>
</context>
<context>
    <name>cornerwright::HistogramView</name>
    <message>
        <source>Histogram</source>
        <translation>Histogramm</translation>
    </message>
    <message>
        <source>no values</source>
        <translation>keine Werte</translation>
    </message>
    <message>
        <source>%1 values from %2 to %3</source>
        <translation>%1 Werte von %2 bis %3</translation>
    </message>
    <message>
        <source>%1 from %2 to %3</source>
        <translation>%1 von %2 bis %3</translation>
    </message>
    <message>
        <source>no values yet</source>
        <translation>noch keine Werte</translation>
    </message>
    <message>
        <source>limit %1</source>
        <translation>Grenze %1</translation>
    </message>
</context>
<context>
    <name>cornerwright::ImportForm</name>
    <message>
        <source>Turn the sign</source>
        <translation>Vorzeichen drehen</translation>
    </message>
    <message>
        <source>Case</source>
        <translation>Strecke</translation>
    </message>
    <message>
        <source>a frequency response</source>
        <translation>ein Frequenzgang</translation>
    </message>
    <message>
        <source>a time record</source>
        <translation>eine Zeitaufzeichnung</translation>
    </message>
    <message>
        <source>File holds</source>
        <translation>Datei enthält</translation>
    </message>
    <message>
        <source>as usual (21, of one port 11)</source>
        <translation>wie üblich (21, bei einem Tor 11)</translation>
    </message>
    <message>
        <source>Network parameter</source>
        <translation>Netzwerkparameter</translation>
    </message>
    <message>
        <source>Excitation</source>
        <translation>Anregung</translation>
    </message>
    <message>
        <source>Response</source>
        <translation>Antwort</translation>
    </message>
    <message>
        <source>as the file says</source>
        <translation>wie die Datei sagt</translation>
    </message>
    <message>
        <source>Sample period</source>
        <translation>Abtastzeit</translation>
    </message>
    <message>
        <source>H1: noise on the response</source>
        <translation>H1: Rauschen auf der Antwort</translation>
    </message>
    <message>
        <source>H2: noise on the excitation</source>
        <translation>H2: Rauschen auf der Anregung</translation>
    </message>
    <message>
        <source>tone by tone: stepped sine</source>
        <translation>Ton für Ton: gestufter Sinus</translation>
    </message>
    <message>
        <source>Estimate</source>
        <translation>Schätzung</translation>
    </message>
    <message>
        <source>Averages</source>
        <translation>Mittelungen</translation>
    </message>
    <message>
        <source>Hann</source>
        <translation>Hann</translation>
    </message>
    <message>
        <source>Hamming</source>
        <translation>Hamming</translation>
    </message>
    <message>
        <source>Blackman</source>
        <translation>Blackman</translation>
    </message>
    <message>
        <source>rectangular</source>
        <translation>Rechteck</translation>
    </message>
    <message>
        <source>Window</source>
        <translation>Fensterung</translation>
    </message>
    <message>
        <source>a straight line</source>
        <translation>eine Gerade</translation>
    </message>
    <message>
        <source>the mean</source>
        <translation>der Mittelwert</translation>
    </message>
    <message>
        <source>nothing</source>
        <translation>nichts</translation>
    </message>
    <message>
        <source>Taken off</source>
        <translation>Abgezogen</translation>
    </message>
    <message>
        <source>the plant P</source>
        <translation>die Strecke P</translation>
    </message>
    <message>
        <source>loop gain L, with this compensator</source>
        <translation>Kreisverstärkung L, mit diesem Regler</translation>
    </message>
    <message>
        <source>closed loop T, with this compensator</source>
        <translation>geschlossener Kreis T, mit diesem Regler</translation>
    </message>
    <message>
        <source>Measured was</source>
        <translation>Gemessen wurde</translation>
    </message>
    <message>
        <source>none</source>
        <translation>keine</translation>
    </message>
    <message>
        <source>Delay to take out</source>
        <translation>Herauszunehmende Totzeit</translation>
    </message>
    <message>
        <source>Integrators</source>
        <translation>Integratoren</translation>
    </message>
    <message>
        <source>Unstable poles</source>
        <translation>Instabile Pole</translation>
    </message>
    <message>
        <source>? choose</source>
        <translation>? wählen</translation>
    </message>
    <message>
        <source>a coherence is from 0 to 1</source>
        <translation>eine Kohärenz liegt zwischen 0 und 1</translation>
    </message>
    <message>
        <source>Leave out below coherence</source>
        <translation>Auslassen unter Kohärenz</translation>
    </message>
</context>
<context>
    <name>cornerwright::ImportPanel</name>
    <message>
        <source>… %1, being read</source>
        <translation>… %1, wird gelesen</translation>
    </message>
    <message>
        <source>✓ %1, %2 points</source>
        <translation>✓ %1, %2 Punkte</translation>
    </message>
    <message>
        <source>? %1, to be settled</source>
        <translation>? %1, noch zu klären</translation>
    </message>
    <message>
        <source>✗ %1, cannot be read</source>
        <translation>✗ %1, nicht lesbar</translation>
    </message>
    <message>
        <source>Measurements to take in</source>
        <translation>Aufzunehmende Messungen</translation>
    </message>
    <message>
        <source>Take in</source>
        <translation>Aufnehmen</translation>
    </message>
    <message>
        <source>settle all files alike</source>
        <translation>alle Dateien gleich klären</translation>
    </message>
    <message>
        <source>leave this file out</source>
        <translation>diese Datei auslassen</translation>
    </message>
    <message>
        <source>back without taking in</source>
        <translation>zurück ohne Aufnehmen</translation>
    </message>
    <message>
        <source>Columns, units, sign, delay and what was measured, for every file here</source>
        <translation>Spalten, Einheiten, Vorzeichen, Totzeit und was gemessen wurde, für jede Datei hier</translation>
    </message>
    <message>
        <source>Make a plant case of every file that is ready</source>
        <translation>Aus jeder fertigen Datei eine Strecke machen</translation>
    </message>
    <message>
        <source>Files to take in</source>
        <translation>Aufzunehmende Dateien</translation>
    </message>
    <message>
        <source>What was understood</source>
        <translation>Was verstanden wurde</translation>
    </message>
    <message>
        <source>What the file does not say</source>
        <translation>Was die Datei nicht sagt</translation>
    </message>
    <message>
        <source>Taken in: %1.</source>
        <translation>Aufgenommen: %1.</translation>
    </message>
    <message>
        <source>Written: %1.</source>
        <translation>Geschrieben: %1.</translation>
    </message>
    <message>
        <source>Take in %1</source>
        <translation>%1 aufnehmen</translation>
    </message>
    <message>
        <source>%1 of %2 ready, reading …</source>
        <translation>%1 von %2 fertig, wird gelesen …</translation>
    </message>
    <message>
        <source>%1 of %2 ready</source>
        <translation>%1 von %2 fertig</translation>
    </message>
    <message>
        <source>To be settled: %1</source>
        <translation>Zu klären: %1</translation>
    </message>
    <message>
        <source>The plant will be written to a table of its own beside the project.</source>
        <translation>Die Strecke wird in eine eigene Tabelle neben dem Projekt geschrieben.</translation>
    </message>
</context>
<context>
    <name>cornerwright::LedgerModel</name>
    <message>
        <source>measure</source>
        <translation>Kennzahl</translation>
    </message>
    <message>
        <source>limit</source>
        <translation>Grenze</translation>
    </message>
    <message>
        <source>worst</source>
        <translation>Wert</translation>
    </message>
    <message>
        <source>where</source>
        <translation>wo</translation>
    </message>
    <message>
        <source>headroom</source>
        <translation>Spielraum</translation>
    </message>
    <message>
        <source>state</source>
        <translation>Zustand</translation>
    </message>
    <message>
        <source>%1, headroom %2</source>
        <translation>%1, Spielraum %2</translation>
    </message>
    <message>
        <source>%1, %2: %3 (%4)</source>
        <translation>%1, %2: %3 (%4)</translation>
    </message>
</context>
<context>
    <name>cornerwright::LedgerPanel</name>
    <message>
        <source>Requirements</source>
        <translation>Anforderungen</translation>
    </message>
    <message>
        <source>+ add requirement</source>
        <translation>+ Anforderung</translation>
    </message>
    <message>
        <source>Add requirement</source>
        <translation>Anforderung hinzufügen</translation>
    </message>
    <message>
        <source>Change %1</source>
        <translation>%1 ändern</translation>
    </message>
    <message>
        <source>Requirement ledger</source>
        <translation>Anforderungsliste</translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation>%1 hinzufügen</translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation>%1 wegnehmen</translation>
    </message>
    <message>
        <source>What is the selected requirement?</source>
        <translation>Was ist die gewählte Anforderung?</translation>
    </message>
    <message>
        <source>Go to the worst	Space</source>
        <translation>Zur schlechtesten Stelle	Leertaste</translation>
    </message>
    <message>
        <source>Change the limit	Enter</source>
        <translation>Grenze ändern	Eingabe</translation>
    </message>
    <message>
        <source>Remove	Del</source>
        <translation>Wegnehmen	Entf</translation>
    </message>
    <message>
        <source>What is this?	F1</source>
        <translation>Was ist das?	F1</translation>
    </message>
</context>
<context>
    <name>cornerwright::LegendWidget</name>
    <message>
        <source>Legend</source>
        <translation>Legende</translation>
    </message>
</context>
<context>
    <name>cornerwright::LimitedStepView</name>
    <message>
        <source>Unit step with the output limits</source>
        <translation>Einheitssprung mit den Ausgangsgrenzen</translation>
    </message>
    <message>
        <source>No step with the limits: %1.</source>
        <translation>Kein Sprung mit den Grenzen: %1.</translation>
    </message>
    <message>
        <source>Unit step with the limits, shown case: overshoot %1, settling %2, %3 at a limit.</source>
        <translation>Einheitssprung mit den Grenzen, gezeigte Strecke: Überschwingen %1, Ausregeln %2, %3 an einer Grenze.</translation>
    </message>
    <message>
        <source>not within %1</source>
        <translation>nicht innerhalb %1</translation>
    </message>
    <message>
        <source>output y, to %1</source>
        <translation>Ausgang y, bis %1</translation>
    </message>
    <message>
        <source>control u with its limits</source>
        <translation>Stellgröße u mit ihren Grenzen</translation>
    </message>
</context>
<context>
    <name>cornerwright::LoopPlanePane</name>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
    <message>
        <source>other cases</source>
        <translation>andere Strecken</translation>
    </message>
    <message>
        <source>realised</source>
        <translation>verwirklicht</translation>
    </message>
    <message>
        <source>loop</source>
        <translation>Kreis</translation>
    </message>
    <message>
        <source>gain</source>
        <translation>Verstärkung</translation>
    </message>
    <message>
        <source>case</source>
        <translation>Strecke</translation>
    </message>
</context>
<context>
    <name>cornerwright::MagnitudePane</name>
    <message>
        <source>gain</source>
        <translation>Verstärkung</translation>
    </message>
    <message>
        <source>Add at %1</source>
        <translation>Hinzufügen bei %1</translation>
    </message>
    <message>
        <source>Add %1</source>
        <translation>%1 hinzufügen</translation>
    </message>
    <message>
        <source>%1 unstable</source>
        <translation>%1 instabil</translation>
    </message>
    <message>
        <source>%1: stability not determined</source>
        <translation>%1: Stabilität nicht bestimmt</translation>
    </message>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
    <message>
        <source>crossover %1</source>
        <translation>Durchtritt %1</translation>
    </message>
    <message>
        <source>Magnitude</source>
        <translation>Betrag</translation>
    </message>
</context>
<context>
    <name>cornerwright::MainWindow</name>
    <message>
        <source>Turn section off or on</source>
        <translation>Glied ab- oder anschalten</translation>
    </message>
    <message>
        <source>Lock or unlock section</source>
        <translation>Glied sperren oder lösen</translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation>%1 wegnehmen</translation>
    </message>
    <message>
        <source>Assessing every case …</source>
        <translation>Jede Strecke wird beurteilt …</translation>
    </message>
    <message>
        <source>The assessment failed: %1</source>
        <translation>Die Beurteilung schlug fehl: %1</translation>
    </message>
    <message>
        <source>Placing the unlocked corners …</source>
        <translation>Freie Ecken werden platziert …</translation>
    </message>
    <message>
        <source>Placing the unlocked corners … %1 %</source>
        <translation>Freie Ecken werden platziert … %1 %</translation>
    </message>
    <message>
        <source>Place corners</source>
        <translation>Ecken platzieren</translation>
    </message>
    <message>
        <source>The design was changed while corners were placed. %1</source>
        <translation>Der Entwurf wurde geändert, während Ecken platziert wurden. %1</translation>
    </message>
    <message>
        <source>Take the placed corners</source>
        <translation>Platzierte Ecken nehmen</translation>
    </message>
    <message>
        <source>Keep the present design</source>
        <translation>Jetzigen Entwurf behalten</translation>
    </message>
    <message>
        <source>%1[*] - Cornerwright</source>
        <translation>%1[*] - Cornerwright</translation>
    </message>
    <message>
        <source>unsaved changes</source>
        <translation>ungesicherte Änderungen</translation>
    </message>
    <message>
        <source>%1 has unsaved changes. Save them before leaving?</source>
        <translation>%1 hat ungesicherte Änderungen. Vor dem Beenden sichern?</translation>
    </message>
    <message>
        <source>&amp;Lower centre</source>
        <translation>&amp;Unten Mitte</translation>
    </message>
    <message>
        <source>&amp;Upper right</source>
        <translation>&amp;Oben rechts</translation>
    </message>
    <message>
        <source>Lower &amp;right</source>
        <translation>Unten &amp;rechts</translation>
    </message>
    <message>
        <source>&amp;File</source>
        <translation>&amp;Datei</translation>
    </message>
    <message>
        <source>Open &amp;recent</source>
        <translation>&amp;Zuletzt geöffnet</translation>
    </message>
    <message>
        <source>&amp;Edit</source>
        <translation>&amp;Bearbeiten</translation>
    </message>
    <message>
        <source>&amp;View</source>
        <translation>&amp;Ansicht</translation>
    </message>
    <message>
        <source>&amp;Design</source>
        <translation>&amp;Entwurf</translation>
    </message>
    <message>
        <source>&amp;Help</source>
        <translation>&amp;Hilfe</translation>
    </message>
    <message>
        <source>The language changes when the program is started next.</source>
        <translation>Die Sprache wechselt beim nächsten Start des Programms.</translation>
    </message>
    <message>
        <source>Click the pane to print first, or print it from the menu Panes.</source>
        <translation>Zuerst das Feld anklicken, das gedruckt werden soll, oder es aus dem Menü Felder drucken.</translation>
    </message>
    <message>
        <source>Langua&amp;ge</source>
        <translation>S&amp;prache</translation>
    </message>
    <message>
        <source>&amp;Panes</source>
        <translation>&amp;Felder</translation>
    </message>
</context>
<context>
    <name>cornerwright::MeasurementFlow</name>
    <message>
        <source>A model is fitted to a measured case; this one has no measurement.</source>
        <translation>Ein Modell wird einer gemessenen Strecke angepasst; diese hat keine Messung.</translation>
    </message>
</context>
<context>
    <name>cornerwright::NicholsPane</name>
    <message>
        <source>limit of %1</source>
        <translation>Grenze von %1</translation>
    </message>
    <message>
        <source>Nichols</source>
        <translation>Nichols</translation>
    </message>
</context>
<context>
    <name>cornerwright::NoticeStrip</name>
    <message>
        <source>Problem</source>
        <translation>Problem</translation>
    </message>
    <message>
        <source>Notice</source>
        <translation>Hinweis</translation>
    </message>
    <message>
        <source>Close this notice</source>
        <translation>Diesen Hinweis schließen</translation>
    </message>
</context>
<context>
    <name>cornerwright::NyquistPane</name>
    <message>
        <source>compressed</source>
        <translation>gestaucht</translation>
    </message>
    <message>
        <source>linear</source>
        <translation>linear</translation>
    </message>
    <message>
        <source>The plane as it is</source>
        <translation>Die Ebene, wie sie ist</translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation>Grenze von %1</translation>
    </message>
    <message>
        <source>Nyquist</source>
        <translation>Nyquist</translation>
    </message>
    <message>
        <source>Radius beyond 1 drawn about one unit a decade, so that all of the loop stays in sight</source>
        <translation>Radius über 1 mit etwa einer Einheit je Dekade gezeichnet, damit der ganze Kreis in Sicht bleibt</translation>
    </message>
</context>
<context>
    <name>cornerwright::PaneSlot</name>
    <message>
        <source>Take the whole window</source>
        <translation>Das ganze Fenster nehmen</translation>
    </message>
    <message>
        <source>Show another pane here</source>
        <translation>Hier ein anderes Feld zeigen</translation>
    </message>
    <message>
        <source>Pane: %1</source>
        <translation>Feld: %1</translation>
    </message>
    <message>
        <source>%1: take the whole window</source>
        <translation>%1: das ganze Fenster nehmen</translation>
    </message>
    <message>
        <source>Go back to all panes</source>
        <translation>Zurück zu allen Feldern</translation>
    </message>
    <message>
        <source>What is this?</source>
        <translation>Was ist das?</translation>
    </message>
    <message>
        <source>%1: what is this?</source>
        <translation>%1: was ist das?</translation>
    </message>
</context>
<context>
    <name>cornerwright::PhasePane</name>
    <message>
        <source>Phase</source>
        <translation>Phase</translation>
    </message>
</context>
<context>
    <name>cornerwright::PlotPane</name>
    <message>
        <source>Move %1</source>
        <translation>%1 bewegen</translation>
    </message>
    <message>
        <source>Nudge %1</source>
        <translation>%1 rücken</translation>
    </message>
    <message>
        <source>Remove %1</source>
        <translation>%1 wegnehmen</translation>
    </message>
    <message>
        <source>Turn %1 on</source>
        <translation>%1 anschalten</translation>
    </message>
    <message>
        <source>Turn %1 off</source>
        <translation>%1 abschalten</translation>
    </message>
    <message>
        <source>%1 could not be written.</source>
        <translation>%1 ließ sich nicht schreiben.</translation>
    </message>
    <message>
        <source>Show all</source>
        <translation>Alles zeigen</translation>
    </message>
    <message>
        <source>Copy as picture</source>
        <translation>Als Bild kopieren</translation>
    </message>
    <message>
        <source>Save picture …</source>
        <translation>Bild sichern …</translation>
    </message>
    <message>
        <source>Save data as CSV …</source>
        <translation>Daten als CSV sichern …</translation>
    </message>
    <message>
        <source>Save picture of %1</source>
        <translation>Bild von %1 sichern</translation>
    </message>
    <message>
        <source>PDF (*.pdf);;SVG (*.svg);;PNG (*.png)</source>
        <translation>PDF (*.pdf);;SVG (*.svg);;PNG (*.png)</translation>
    </message>
    <message>
        <source>Save data of %1</source>
        <translation>Daten von %1 sichern</translation>
    </message>
    <message>
        <source>Comma-separated values (*.csv)</source>
        <translation>Kommagetrennte Werte (*.csv)</translation>
    </message>
    <message>
        <source>Hide the other cases</source>
        <translation>Andere Strecken ausblenden</translation>
    </message>
    <message>
        <source>Show every case</source>
        <translation>Jede Strecke zeigen</translation>
    </message>
    <message>
        <source>Print …</source>
        <translation>Drucken …</translation>
    </message>
    <message>
        <source>Print %1</source>
        <translation>%1 drucken</translation>
    </message>
    <message>
        <source>%1 could not be printed.</source>
        <translation>%1 ließ sich nicht drucken.</translation>
    </message>
</context>
<context>
    <name>cornerwright::QualityPane</name>
    <message>
        <source>What the measurement file says</source>
        <translation>Was die Messdatei sagt</translation>
    </message>
    <message>
        <source>coherence</source>
        <translation>Kohärenz</translation>
    </message>
    <message>
        <source>random error</source>
        <translation>Zufallsfehler</translation>
    </message>
    <message>
        <source>fit misfit</source>
        <translation>Abweichung der Anpassung</translation>
    </message>
    <message>
        <source>case shown</source>
        <translation>gezeigte Strecke</translation>
    </message>
    <message>
        <source>other cases</source>
        <translation>andere Strecken</translation>
    </message>
    <message>
        <source>no fit of this case</source>
        <translation>keine Anpassung dieser Strecke</translation>
    </message>
    <message>
        <source>not known for this case</source>
        <translation>für diese Strecke nicht bekannt</translation>
    </message>
    <message>
        <source>case</source>
        <translation>Strecke</translation>
    </message>
    <message>
        <source>Measurement quality</source>
        <translation>Messgüte</translation>
    </message>
</context>
<context>
    <name>cornerwright::RealisationPane</name>
    <message>
        <source>No difference equation: only the design loop is judged.</source>
        <translation>Keine Differenzengleichung: nur der Entwurfskreis wird beurteilt.</translation>
    </message>
    <message>
        <source>%1 second-order sections</source>
        <translation>%1 Abschnitte 2. Ordnung</translation>
    </message>
    <message>
        <source>design loop counts hold and delay</source>
        <translation>Entwurfskreis zählt Halteglied und Totzeit</translation>
    </message>
    <message>
        <source>judge the difference equation</source>
        <translation>Differenzengleichung beurteilen</translation>
    </message>
    <message>
        <source>direct form 1</source>
        <translation>Direktform 1</translation>
    </message>
    <message>
        <source>direct form 2 transposed</source>
        <translation>Direktform 2, transponiert</translation>
    </message>
    <message>
        <source>delta operator</source>
        <translation>Delta-Operator</translation>
    </message>
    <message>
        <source>64-bit floating point</source>
        <translation>Gleitkomma, 64 Bit</translation>
    </message>
    <message>
        <source>32-bit floating point</source>
        <translation>Gleitkomma, 32 Bit</translation>
    </message>
    <message>
        <source>fixed point</source>
        <translation>Festkomma</translation>
    </message>
    <message>
        <source>%1 bits</source>
        <translation>%1 Bit</translation>
    </message>
    <message>
        <source>Sample period or rate</source>
        <translation>Abtastzeit oder -rate</translation>
    </message>
    <message>
        <source>Computation delay</source>
        <translation>Rechenzeit</translation>
    </message>
    <message>
        <source>Method</source>
        <translation>Verfahren</translation>
    </message>
    <message>
        <source>Exact at</source>
        <translation>Genau bei</translation>
    </message>
    <message>
        <source>Structure</source>
        <translation>Struktur</translation>
    </message>
    <message>
        <source>Number format</source>
        <translation>Zahlenformat</translation>
    </message>
    <message>
        <source>Word length</source>
        <translation>Wortlänge</translation>
    </message>
    <message>
        <source>Fraction bits</source>
        <translation>Nachkommabits</translation>
    </message>
    <message>
        <source>Sampling, realisation and handover</source>
        <translation>Abtastung, Verwirklichung und Übergabe</translation>
    </message>
    <message>
        <source>Expected a value above zero.</source>
        <translation>Ein Wert über null wird erwartet.</translation>
    </message>
    <message>
        <source>Expected a delay of zero or more.</source>
        <translation>Eine Totzeit von null oder mehr wird erwartet.</translation>
    </message>
    <message>
        <source>Expected a whole number from 0 to %1.</source>
        <translation>Eine ganze Zahl von 0 bis %1 wird erwartet.</translation>
    </message>
    <message>
        <source>Change sample period</source>
        <translation>Abtastzeit ändern</translation>
    </message>
    <message>
        <source>Change computation delay</source>
        <translation>Rechenzeit ändern</translation>
    </message>
    <message>
        <source>Count hold in the design loop</source>
        <translation>Halteglied im Entwurfskreis zählen</translation>
    </message>
    <message>
        <source>Judge the difference equation</source>
        <translation>Differenzengleichung beurteilen</translation>
    </message>
    <message>
        <source>Change matched frequency</source>
        <translation>Genaue Frequenz ändern</translation>
    </message>
    <message>
        <source>Change fraction bits</source>
        <translation>Nachkommabits ändern</translation>
    </message>
    <message>
        <source>Change method</source>
        <translation>Verfahren ändern</translation>
    </message>
    <message>
        <source>Change structure</source>
        <translation>Struktur ändern</translation>
    </message>
    <message>
        <source>Change number format</source>
        <translation>Zahlenformat ändern</translation>
    </message>
    <message>
        <source>Change word length</source>
        <translation>Wortlänge ändern</translation>
    </message>
    <message>
        <source>Handover</source>
        <translation>Übergabe</translation>
    </message>
    <message>
        <source>Lowest output</source>
        <translation>Kleinster Ausgang</translation>
    </message>
    <message>
        <source>Highest output</source>
        <translation>Größter Ausgang</translation>
    </message>
    <message>
        <source>limit the output, with conditional integration</source>
        <translation>Ausgang begrenzen, mit bedingter Integration</translation>
    </message>
    <message>
        <source>Expected a value below the highest output.</source>
        <translation>Ein Wert unter dem größten Ausgang wird erwartet.</translation>
    </message>
    <message>
        <source>Expected a value above the lowest output.</source>
        <translation>Ein Wert über dem kleinsten Ausgang wird erwartet.</translation>
    </message>
    <message>
        <source>Change output limits</source>
        <translation>Ausgangsgrenzen ändern</translation>
    </message>
</context>
<context>
    <name>cornerwright::RecoveryCopy</name>
    <message>
        <source>The recovery copy could not be written to %1.</source>
        <translation>Die Sicherungskopie ließ sich nicht nach %1 schreiben.</translation>
    </message>
</context>
<context>
    <name>cornerwright::RequirementEditor</name>
    <message>
        <source>Measure</source>
        <translation>Kennzahl</translation>
    </message>
    <message>
        <source>At least</source>
        <translation>Mindestens</translation>
    </message>
    <message>
        <source>At most</source>
        <translation>Höchstens</translation>
    </message>
    <message>
        <source>none</source>
        <translation>keine</translation>
    </message>
    <message>
        <source>step</source>
        <translation>Sprung</translation>
    </message>
    <message>
        <source>ramp</source>
        <translation>Rampe</translation>
    </message>
    <message>
        <source>parabola</source>
        <translation>Parabel</translation>
    </message>
    <message>
        <source>Input</source>
        <translation>Führung</translation>
    </message>
    <message>
        <source>Remove</source>
        <translation>Wegnehmen</translation>
    </message>
    <message>
        <source>Done</source>
        <translation>Fertig</translation>
    </message>
    <message>
        <source>at least</source>
        <translation>mindestens</translation>
    </message>
    <message>
        <source>at most</source>
        <translation>höchstens</translation>
    </message>
    <message>
        <source>band</source>
        <translation>Band</translation>
    </message>
    <message>
        <source>up to</source>
        <translation>bis</translation>
    </message>
    <message>
        <source>from</source>
        <translation>ab</translation>
    </message>
    <message>
        <source>input</source>
        <translation>Führung</translation>
    </message>
</context>
<context>
    <name>cornerwright::ResponsePreview</name>
    <message>
        <source>Magnitude of the measurement</source>
        <translation>Betrag der Messung</translation>
    </message>
    <message>
        <source>Phase of the measurement</source>
        <translation>Phase der Messung</translation>
    </message>
</context>
<context>
    <name>cornerwright::RoomPane</name>
    <message>
        <source>free</source>
        <translation>frei</translation>
    </message>
    <message>
        <source>%1 %</source>
        <translation>%1 %</translation>
    </message>
    <message>
        <source>stability</source>
        <translation>Stabilität</translation>
    </message>
    <message>
        <source>section or realisation ends</source>
        <translation>Glied oder Verwirklichung endet</translation>
    </message>
    <message>
        <source>%1, %2</source>
        <translation>%1, %2</translation>
    </message>
    <message>
        <source>gain</source>
        <translation>Verstärkung</translation>
    </message>
    <message>
        <source>corner</source>
        <translation>Ecke</translation>
    </message>
    <message>
        <source>zero</source>
        <translation>Nullstelle</translation>
    </message>
    <message>
        <source>pole</source>
        <translation>Pol</translation>
    </message>
    <message>
        <source>damping</source>
        <translation>Dämpfung</translation>
    </message>
    <message>
        <source>damping of zeros</source>
        <translation>Dämpfung der Nullstellen</translation>
    </message>
    <message>
        <source>damping of poles</source>
        <translation>Dämpfung der Pole</translation>
    </message>
    <message>
        <source>Work out</source>
        <translation>Ausrechnen</translation>
    </message>
    <message>
        <source>Room of every value</source>
        <translation>Raum jedes Werts</translation>
    </message>
    <message>
        <source>section</source>
        <translation>Glied</translation>
    </message>
    <message>
        <source>value</source>
        <translation>Wert</translation>
    </message>
    <message>
        <source>is</source>
        <translation>ist</translation>
    </message>
    <message>
        <source>down</source>
        <translation>ab</translation>
    </message>
    <message>
        <source>then fails</source>
        <translation>dann verletzt</translation>
    </message>
    <message>
        <source>up</source>
        <translation>auf</translation>
    </message>
    <message>
        <source>How far each value may move alone before a requirement fails</source>
        <translation>Wie weit jeder Wert sich allein bewegen darf, bevor eine Anforderung verletzt wird</translation>
    </message>
    <message>
        <source>Left out, since not met now: %1</source>
        <translation>Ausgelassen, weil jetzt nicht erfüllt: %1</translation>
    </message>
    <message>
        <source>run section %1</source>
        <translation>Laufabschnitt %1</translation>
    </message>
    <message>
        <source>of an earlier design</source>
        <translation>von einem früheren Entwurf</translation>
    </message>
    <message>
        <source>stopped: the values looked at so far</source>
        <translation>angehalten: die bisher betrachteten Werte</translation>
    </message>
    <message>
        <source>Room to move</source>
        <translation>Bewegungsraum</translation>
    </message>
</context>
<context>
    <name>cornerwright::RootLocusPane</name>
    <message>
        <source>zero of %1</source>
        <translation>Nullstelle von %1</translation>
    </message>
    <message>
        <source>pole of %1</source>
        <translation>Pol von %1</translation>
    </message>
    <message>
        <source>closed-loop pole</source>
        <translation>Pol des geschlossenen Kreises</translation>
    </message>
    <message>
        <source>branch</source>
        <translation>Ast</translation>
    </message>
    <message>
        <source>Root locus</source>
        <translation>Wurzelortskurve</translation>
    </message>
    <message>
        <source>branches</source>
        <translation>Äste</translation>
    </message>
    <message>
        <source>before</source>
        <translation>vorher</translation>
    </message>
    <message>
        <source>damping %1</source>
        <translation>Dämpfung %1</translation>
    </message>
</context>
<context>
    <name>cornerwright::RunRow</name>
    <message>
        <source>Cancel</source>
        <translation>Abbrechen</translation>
    </message>
    <message>
        <source>Progress</source>
        <translation>Fortschritt</translation>
    </message>
</context>
<context>
    <name>cornerwright::RunStatus</name>
    <message>
        <source>Cancel</source>
        <translation>Abbrechen</translation>
    </message>
</context>
<context>
    <name>cornerwright::SectionCard</name>
    <message>
        <source>Name of the section</source>
        <translation>Name des Glieds</translation>
    </message>
    <message>
        <source>Lock</source>
        <translation>Sperren</translation>
    </message>
    <message>
        <source>Turn off</source>
        <translation>Abschalten</translation>
    </message>
    <message>
        <source>Drag to move in the chain</source>
        <translation>Ziehen, um in der Kette zu verschieben</translation>
    </message>
    <message>
        <source>Section %1: %2</source>
        <translation>Glied %1: %2</translation>
    </message>
    <message>
        <source>Section %1: %2, off</source>
        <translation>Glied %1: %2, aus</translation>
    </message>
    <message>
        <source>%1, %2</source>
        <translation>%1, %2</translation>
    </message>
    <message>
        <source>Unlock %1</source>
        <translation>%1 lösen</translation>
    </message>
    <message>
        <source>Lock %1: its corners stay where they are</source>
        <translation>%1 sperren: die Ecken bleiben, wo sie sind</translation>
    </message>
    <message>
        <source>Turn %1 off</source>
        <translation>%1 abschalten</translation>
    </message>
    <message>
        <source>Turn %1 on</source>
        <translation>%1 anschalten</translation>
    </message>
    <message>
        <source>Move %1</source>
        <translation>%1 bewegen</translation>
    </message>
    <message>
        <source>off · press space to turn on</source>
        <translation>aus · Leertaste schaltet an</translation>
    </message>
    <message>
        <source>Change %1 of %2</source>
        <translation>%1 von %2 ändern</translation>
    </message>
    <message>
        <source>Lock %1</source>
        <translation>%1 sperren</translation>
    </message>
    <message>
        <source>Rename %1</source>
        <translation>%1 umbenennen</translation>
    </message>
    <message>
        <source>Turn off	Space</source>
        <translation>Abschalten	Leertaste</translation>
    </message>
    <message>
        <source>Turn on	Space</source>
        <translation>Anschalten	Leertaste</translation>
    </message>
    <message>
        <source>Unlock	L</source>
        <translation>Lösen	L</translation>
    </message>
    <message>
        <source>Lock	L</source>
        <translation>Sperren	L</translation>
    </message>
    <message>
        <source>Rename	F2</source>
        <translation>Umbenennen	F2</translation>
    </message>
    <message>
        <source>Move up	Alt+Up</source>
        <translation>Nach oben	Alt+Auf</translation>
    </message>
    <message>
        <source>Move down	Alt+Down</source>
        <translation>Nach unten	Alt+Ab</translation>
    </message>
    <message>
        <source>Remove	Del</source>
        <translation>Wegnehmen	Entf</translation>
    </message>
</context>
<context>
    <name>cornerwright::SensitivityPane</name>
    <message>
        <source>design loop</source>
        <translation>Entwurfskreis</translation>
    </message>
    <message>
        <source>realised loop</source>
        <translation>verwirklichter Kreis</translation>
    </message>
    <message>
        <source>other cases</source>
        <translation>andere Strecken</translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation>Grenze von %1</translation>
    </message>
    <message>
        <source>case</source>
        <translation>Strecke</translation>
    </message>
    <message>
        <source>loop</source>
        <translation>Kreis</translation>
    </message>
    <message>
        <source>Sensitivity</source>
        <translation>Empfindlichkeit</translation>
    </message>
</context>
<context>
    <name>cornerwright::StepPane</name>
    <message>
        <source>output y</source>
        <translation>Ausgang y</translation>
    </message>
    <message>
        <source>control u</source>
        <translation>Stellgröße u</translation>
    </message>
    <message>
        <source>disturbance</source>
        <translation>Störung</translation>
    </message>
    <message>
        <source>design</source>
        <translation>Entwurf</translation>
    </message>
    <message>
        <source>realised</source>
        <translation>verwirklicht</translation>
    </message>
    <message>
        <source>limit of %1</source>
        <translation>Grenze von %1</translation>
    </message>
    <message>
        <source>design loop unstable</source>
        <translation>Entwurfskreis instabil</translation>
    </message>
    <message>
        <source>case</source>
        <translation>Strecke</translation>
    </message>
    <message>
        <source>loop</source>
        <translation>Kreis</translation>
    </message>
    <message>
        <source>Step response</source>
        <translation>Sprungantwort</translation>
    </message>
</context>
<context>
    <name>cornerwright::StudyView</name>
    <message>
        <source>direct form 1</source>
        <translation>Direktform 1</translation>
    </message>
    <message>
        <source>direct form 2 transposed</source>
        <translation>Direktform 2, transponiert</translation>
    </message>
    <message>
        <source>delta operator</source>
        <translation>Delta-Operator</translation>
    </message>
    <message>
        <source>loses a pole</source>
        <translation>verliert einen Pol</translation>
    </message>
    <message>
        <source>Error of the poles in this number format: %1. They are kept best by: %2.</source>
        <translation>Fehler der Pole in diesem Zahlenformat: %1. Am besten hält sie: %2.</translation>
    </message>
    <message>
        <source>Words of %1 bits: at least %2 fraction bits meet every requirement.</source>
        <translation>Wörter von %1 Bit: ab %2 Nachkommabits ist jede Anforderung erfüllt.</translation>
    </message>
    <message>
        <source>Words of %1 bits: %2.</source>
        <translation>Wörter von %1 Bit: %2.</translation>
    </message>
    <message>
        <source>Rounding noise at the output %1 rms.</source>
        <translation>Rundungsrauschen am Ausgang %1 effektiv.</translation>
    </message>
    <message>
        <source> Zero-input limit cycle: not determined, %1.</source>
        <translation> Grenzzyklus ohne Eingang: nicht bestimmt, %1.</translation>
    </message>
    <message>
        <source> No zero-input limit cycle found.</source>
        <translation> Kein Grenzzyklus ohne Eingang gefunden.</translation>
    </message>
    <message>
        <source> Zero-input limit cycle of %1, period %2 samples.</source>
        <translation> Grenzzyklus ohne Eingang von %1, Periode %2 Abtastungen.</translation>
    </message>
    <message>
        <source> Smallest error still integrated: %1.</source>
        <translation> Kleinste noch integrierte Abweichung: %1.</translation>
    </message>
    <message>
        <source>Least headroom for a full-scale input: %1 bits (%2, L1 bound %3).</source>
        <translation>Kleinste Reserve bei Vollaussteuerung: %1 Bit (%2, L1-Schranke %3).</translation>
    </message>
    <message>
        <source>Tustin</source>
        <translation>Tustin</translation>
    </message>
    <message>
        <source>Tustin, exact at each corner</source>
        <translation>Tustin, an jeder Ecke genau</translation>
    </message>
    <message>
        <source>Tustin, exact at one frequency</source>
        <translation>Tustin, bei einer Frequenz genau</translation>
    </message>
    <message>
        <source>matched roots</source>
        <translation>abgebildete Wurzeln</translation>
    </message>
    <message>
        <source>step invariant</source>
        <translation>sprunginvariant</translation>
    </message>
    <message>
        <source>ramp invariant</source>
        <translation>rampeninvariant</translation>
    </message>
    <message>
        <source>Headroom of every requirement with each method</source>
        <translation>Spielraum jeder Anforderung mit jedem Verfahren</translation>
    </message>
    <message>
        <source>What each method costs on the realised loops; being worked out anew …</source>
        <translation>Was jedes Verfahren an den verwirklichten Kreisen kostet; wird neu ausgerechnet …</translation>
    </message>
    <message>
        <source>What each method costs on the realised loops, the worst case of each: value and headroom. Enter on a row takes the method.</source>
        <translation>Was jedes Verfahren an den verwirklichten Kreisen kostet, je die schlechteste Strecke: Wert und Spielraum. Eingabe auf einer Zeile nimmt das Verfahren.</translation>
    </message>
    <message>
        <source>method</source>
        <translation>Verfahren</translation>
    </message>
    <message>
        <source>%1: cannot be</source>
        <translation>%1: geht nicht</translation>
    </message>
</context>
<context>
    <name>cornerwright::ToleranceForm</name>
    <message>
        <source>plant gain ±</source>
        <translation>Streckenverstärkung ±</translation>
    </message>
    <message>
        <source>plant corners ±</source>
        <translation>Streckenecken ±</translation>
    </message>
    <message>
        <source>plant damping ±</source>
        <translation>Streckendämpfung ±</translation>
    </message>
    <message>
        <source>dead time ±</source>
        <translation>Totzeit ±</translation>
    </message>
    <message>
        <source>components ±</source>
        <translation>Bauteile ±</translation>
    </message>
    <message>
        <source>falls</source>
        <translation>fällt</translation>
    </message>
    <message>
        <source>evenly</source>
        <translation>gleichmäßig</translation>
    </message>
    <message>
        <source>as a bell, spread = 3 σ</source>
        <translation>als Glocke, Streuung = 3 σ</translation>
    </message>
    <message>
        <source>How values fall inside the spread</source>
        <translation>Wie Werte innerhalb der Streuung fallen</translation>
    </message>
    <message>
        <source>samples</source>
        <translation>Proben</translation>
    </message>
    <message>
        <source>seed</source>
        <translation>Startwert</translation>
    </message>
    <message>
        <source>expected %1 to %2</source>
        <translation>erwartet: %1 bis %2</translation>
    </message>
    <message>
        <source>expected 0 to 99.9 %</source>
        <translation>erwartet: 0 bis 99.9 %</translation>
    </message>
</context>
<context>
    <name>cornerwright::TolerancePane</name>
    <message>
        <source>%1 %</source>
        <translation>%1 %</translation>
    </message>
    <message>
        <source>Keep worst sample as plant case</source>
        <translation>Schlechteste Probe als Strecke behalten</translation>
    </message>
    <message>
        <source>Run samples</source>
        <translation>Proben rechnen</translation>
    </message>
    <message>
        <source>Smallest share of headroom of every sample</source>
        <translation>Kleinster Spielraumanteil jeder Probe</translation>
    </message>
    <message>
        <source>Requirements over the samples</source>
        <translation>Anforderungen über die Proben</translation>
    </message>
    <message>
        <source>requirement</source>
        <translation>Anforderung</translation>
    </message>
    <message>
        <source>met</source>
        <translation>erfüllt</translation>
    </message>
    <message>
        <source>unmet</source>
        <translation>verletzt</translation>
    </message>
    <message>
        <source>smallest share</source>
        <translation>kleinster Anteil</translation>
    </message>
    <message>
        <source>worst sample of %1</source>
        <translation>schlechteste Probe von %1</translation>
    </message>
    <message>
        <source>Yield %1: %2 of %3 samples met, %4 unmet, %5 not determined (%6 to %7 with 95 % confidence)</source>
        <translation>Ausbeute %1: %2 von %3 Proben erfüllt, %4 verletzt, %5 nicht bestimmt (%6 bis %7 mit 95 % Vertrauen)</translation>
    </message>
    <message>
        <source>not stable</source>
        <translation>nicht stabil</translation>
    </message>
    <message>
        <source>Worst: sample %1, %2, %3</source>
        <translation>Schlechteste: Probe %1, %2, %3</translation>
    </message>
    <message>
        <source>of an earlier design</source>
        <translation>von einem früheren Entwurf</translation>
    </message>
    <message>
        <source>stopped: the samples judged so far</source>
        <translation>angehalten: die bisher beurteilten Proben</translation>
    </message>
    <message>
        <source>Tolerance</source>
        <translation>Toleranz</translation>
    </message>
</context>
<context>
    <name>cornerwright::TopBar</name>
    <message>
        <source>The case drawn full, with the handles on its curve</source>
        <translation>Die kräftig gezeichnete Strecke, mit den Griffen auf ihrer Kurve</translation>
    </message>
    <message>
        <source>A kept trial to compare with</source>
        <translation>Ein aufgehobener Versuch zum Vergleich</translation>
    </message>
    <message>
        <source>Hz</source>
        <translation>Hz</translation>
    </message>
    <message>
        <source>rad/s</source>
        <translation>rad/s</translation>
    </message>
    <message>
        <source>Frequencies in Hz; switch to rad/s</source>
        <translation>Frequenzen in Hz; auf rad/s umschalten</translation>
    </message>
    <message>
        <source>Frequencies in rad/s; switch to Hz</source>
        <translation>Frequenzen in rad/s; auf Hz umschalten</translation>
    </message>
    <message>
        <source>no case</source>
        <translation>keine Strecke</translation>
    </message>
    <message>
        <source>Case: %1 ▾</source>
        <translation>Strecke: %1 ▾</translation>
    </message>
    <message>
        <source>Case shown: %1</source>
        <translation>Gezeigte Strecke: %1</translation>
    </message>
    <message>
        <source>Trial: none ▾</source>
        <translation>Versuch: keiner ▾</translation>
    </message>
    <message>
        <source>Trial: %1 ▾</source>
        <translation>Versuch: %1 ▾</translation>
    </message>
    <message>
        <source>Compared trial: none</source>
        <translation>Verglichener Versuch: keiner</translation>
    </message>
    <message>
        <source>Compared trial: %1</source>
        <translation>Verglichener Versuch: %1</translation>
    </message>
</context>
<context>
    <name>cornerwright::TrialBook</name>
    <message>
        <source>trial %1</source>
        <translation>Versuch %1</translation>
    </message>
    <message>
        <source>compare with none</source>
        <translation>mit keinem vergleichen</translation>
    </message>
</context>
<context>
    <name>cornerwright::TrialsPane</name>
    <message>
        <source>▲ better</source>
        <translation>▲ besser</translation>
    </message>
    <message>
        <source>▼ worse</source>
        <translation>▼ schlechter</translation>
    </message>
    <message>
        <source>No trial kept yet. Keep (Ctrl+K) puts a copy of the present design here to compare with.</source>
        <translation>Noch kein Versuch aufgehoben. Behalten (Strg+K) legt eine Kopie des jetzigen Entwurfs zum Vergleich hierher.</translation>
    </message>
    <message>
        <source>Differences between the trial and the present design</source>
        <translation>Unterschiede zwischen dem Versuch und dem jetzigen Entwurf</translation>
    </message>
    <message>
        <source>measure</source>
        <translation>Kennzahl</translation>
    </message>
    <message>
        <source>limit</source>
        <translation>Grenze</translation>
    </message>
    <message>
        <source>trial</source>
        <translation>Versuch</translation>
    </message>
    <message>
        <source>now</source>
        <translation>jetzt</translation>
    </message>
    <message>
        <source>change</source>
        <translation>Änderung</translation>
    </message>
    <message>
        <source>Compare with %1</source>
        <translation>Mit %1 vergleichen</translation>
    </message>
    <message>
        <source>Name of the trial</source>
        <translation>Name des Versuchs</translation>
    </message>
    <message>
        <source>Return to it</source>
        <translation>Zurückkehren</translation>
    </message>
    <message>
        <source>Return to %1</source>
        <translation>Zu %1 zurückkehren</translation>
    </message>
    <message>
        <source>Forget %1</source>
        <translation>%1 vergessen</translation>
    </message>
    <message>
        <source>Trials</source>
        <translation>Versuche</translation>
    </message>
</context>
<context>
    <name>cornerwright::VerdictPill</name>
    <message>
        <source>not assessed yet</source>
        <translation>noch nicht beurteilt</translation>
    </message>
    <message>
        <source>Verdict: %1</source>
        <translation>Urteil: %1</translation>
    </message>
</context>
<context>
    <name>cornerwright::WindowActions</name>
    <message>
        <source>&amp;New</source>
        <translation>&amp;Neu</translation>
    </message>
    <message>
        <source>Start an empty project</source>
        <translation>Ein leeres Projekt beginnen</translation>
    </message>
    <message>
        <source>&amp;Open</source>
        <translation>&amp;Öffnen</translation>
    </message>
    <message>
        <source>Open a project file</source>
        <translation>Eine Projektdatei öffnen</translation>
    </message>
    <message>
        <source>&amp;Save</source>
        <translation>&amp;Sichern</translation>
    </message>
    <message>
        <source>Save the project</source>
        <translation>Das Projekt sichern</translation>
    </message>
    <message>
        <source>Save &amp;as</source>
        <translation>Sichern &amp;als</translation>
    </message>
    <message>
        <source>Save the project under another name</source>
        <translation>Das Projekt unter anderem Namen sichern</translation>
    </message>
    <message>
        <source>Add &amp;measurements</source>
        <translation>&amp;Messungen hinzufügen</translation>
    </message>
    <message>
        <source>Take measurement files in as plant cases</source>
        <translation>Messdateien als Strecken aufnehmen</translation>
    </message>
    <message>
        <source>&amp;Quit</source>
        <translation>&amp;Beenden</translation>
    </message>
    <message>
        <source>Leave the program</source>
        <translation>Das Programm verlassen</translation>
    </message>
    <message>
        <source>&amp;Undo</source>
        <translation>&amp;Rückgängig</translation>
    </message>
    <message>
        <source>Take the last step back</source>
        <translation>Den letzten Schritt zurücknehmen</translation>
    </message>
    <message>
        <source>&amp;Redo</source>
        <translation>&amp;Wiederholen</translation>
    </message>
    <message>
        <source>Do the step again</source>
        <translation>Den Schritt noch einmal tun</translation>
    </message>
    <message>
        <source>Add plant &amp;formula</source>
        <translation>Strecken&amp;formel hinzufügen</translation>
    </message>
    <message>
        <source>Add a plant case from a formula in s</source>
        <translation>Eine Strecke aus einer Formel in s hinzufügen</translation>
    </message>
    <message>
        <source>&amp;Remove section</source>
        <translation>&amp;Glied wegnehmen</translation>
    </message>
    <message>
        <source>Remove the selected section</source>
        <translation>Das gewählte Glied wegnehmen</translation>
    </message>
    <message>
        <source>Turn section off or &amp;on</source>
        <translation>Glied ab- oder &amp;anschalten</translation>
    </message>
    <message>
        <source>Turn the selected section off or on</source>
        <translation>Das gewählte Glied ab- oder anschalten</translation>
    </message>
    <message>
        <source>&amp;Lock or unlock section</source>
        <translation>Glied &amp;sperren oder lösen</translation>
    </message>
    <message>
        <source>Locked corners stay where they are</source>
        <translation>Gesperrte Ecken bleiben, wo sie sind</translation>
    </message>
    <message>
        <source>&amp;Hz instead of rad/s</source>
        <translation>&amp;Hz statt rad/s</translation>
    </message>
    <message>
        <source>Show frequencies in Hz or in rad/s</source>
        <translation>Frequenzen in Hz oder in rad/s zeigen</translation>
    </message>
    <message>
        <source>&amp;Next case</source>
        <translation>&amp;Nächste Strecke</translation>
    </message>
    <message>
        <source>Show the next plant case</source>
        <translation>Die nächste Strecke zeigen</translation>
    </message>
    <message>
        <source>&amp;Previous case</source>
        <translation>&amp;Vorige Strecke</translation>
    </message>
    <message>
        <source>Show the plant case before</source>
        <translation>Die vorige Strecke zeigen</translation>
    </message>
    <message>
        <source>Ground as the system has it</source>
        <translation>Grund wie im System</translation>
    </message>
    <message>
        <source>Light ground</source>
        <translation>Heller Grund</translation>
    </message>
    <message>
        <source>Dark ground</source>
        <translation>Dunkler Grund</translation>
    </message>
    <message>
        <source>Pane takes the &amp;whole window</source>
        <translation>Feld nimmt das &amp;ganze Fenster</translation>
    </message>
    <message>
        <source>The pane with the focus takes the whole window</source>
        <translation>Das Feld mit dem Fokus nimmt das ganze Fenster</translation>
    </message>
    <message>
        <source>&amp;All panes again</source>
        <translation>Wieder &amp;alle Felder</translation>
    </message>
    <message>
        <source>Go back to all panes</source>
        <translation>Zurück zu allen Feldern</translation>
    </message>
    <message>
        <source>&amp;Keep as trial</source>
        <translation>Als Versuch &amp;behalten</translation>
    </message>
    <message>
        <source>Keep a copy of this design to compare against</source>
        <translation>Eine Kopie dieses Entwurfs zum Vergleich behalten</translation>
    </message>
    <message>
        <source>Keep</source>
        <translation>Behalten</translation>
    </message>
    <message>
        <source>Compare &amp;trials</source>
        <translation>&amp;Versuche vergleichen</translation>
    </message>
    <message>
        <source>Show kept trials and how their figures differ</source>
        <translation>Aufgehobene Versuche zeigen und wie ihre Kennzahlen sich unterscheiden</translation>
    </message>
    <message>
        <source>&amp;Place corners</source>
        <translation>Ecken &amp;platzieren</translation>
    </message>
    <message>
        <source>Move the unlocked corners so that the smallest headroom grows</source>
        <translation>Die freien Ecken so bewegen, dass der kleinste Spielraum wächst</translation>
    </message>
    <message>
        <source>Place</source>
        <translation>Platzieren</translation>
    </message>
    <message>
        <source>&amp;Handover</source>
        <translation>Ü&amp;bergabe</translation>
    </message>
    <message>
        <source>Sampling and realisation: what the firmware gets</source>
        <translation>Abtastung und Verwirklichung: was die Firmware bekommt</translation>
    </message>
    <message>
        <source>Write &amp;report</source>
        <translation>Be&amp;richt schreiben</translation>
    </message>
    <message>
        <source>Write the design review report as one HTML file</source>
        <translation>Den Prüfbericht als eine HTML-Datei schreiben</translation>
    </message>
    <message>
        <source>Report</source>
        <translation>Bericht</translation>
    </message>
    <message>
        <source>&amp;About Cornerwright</source>
        <translation>Ü&amp;ber Cornerwright</translation>
    </message>
    <message>
        <source>What this program is, and its cautions</source>
        <translation>Was dieses Programm ist, und seine Warnungen</translation>
    </message>
    <message>
        <source>&amp;Undo: %1</source>
        <translation>&amp;Rückgängig: %1</translation>
    </message>
    <message>
        <source>Undo</source>
        <translation>Rückgängig</translation>
    </message>
    <message>
        <source>&amp;Redo: %1</source>
        <translation>&amp;Wiederholen: %1</translation>
    </message>
    <message>
        <source>Redo</source>
        <translation>Wiederholen</translation>
    </message>
    <message>
        <source>&amp;Print pane</source>
        <translation>Feld &amp;drucken</translation>
    </message>
    <message>
        <source>Print the pane with the focus</source>
        <translation>Das Feld mit dem Fokus drucken</translation>
    </message>
    <message>
        <source>Draw &amp;only the shown case</source>
        <translation>&amp;Nur die gezeigte Strecke zeichnen</translation>
    </message>
    <message>
        <source>The others are not drawn; they are judged all the same</source>
        <translation>Die anderen werden nicht gezeichnet; beurteilt werden sie in jedem Fall</translation>
    </message>
    <message>
        <source>Draw &amp;every case</source>
        <translation>&amp;Jede Strecke zeichnen</translation>
    </message>
    <message>
        <source>Draw the curves of every plant case</source>
        <translation>Die Kurven jeder Strecke zeichnen</translation>
    </message>
    <message>
        <source>Language as the system has it</source>
        <translation>Sprache wie im System</translation>
    </message>
    <message>
        <source>&amp;Fit a model to the shown case</source>
        <translation>Der gezeigten Strecke ein &amp;Modell anpassen</translation>
    </message>
    <message>
        <source>Fit a rational model to the measured case, for root locus and step</source>
        <translation>Der gemessenen Strecke ein rationales Modell anpassen, für Wurzelortskurve und Sprung</translation>
    </message>
    <message>
        <source>&amp;What is this?</source>
        <translation>&amp;Was ist das?</translation>
    </message>
    <message>
        <source>Explain what has the focus: definition, formula, source</source>
        <translation>Erklären, was den Fokus hat: Bedeutung, Formel, Quelle</translation>
    </message>
    <message>
        <source>Mouse, &amp;keys and files</source>
        <translation>Maus, &amp;Tasten und Dateien</translation>
    </message>
    <message>
        <source>How the window is worked with</source>
        <translation>Wie man mit dem Fenster arbeitet</translation>
    </message>
</context>
<context>
    <name>main</name>
    <message>
        <source>Write a picture of the window to FILE (PNG) and leave.</source>
        <translation>Ein Bild des Fensters nach FILE (PNG) schreiben und enden.</translation>
    </message>
    <message>
        <source>Size of the window, such as 1600x950.</source>
        <translation>Größe des Fensters, etwa 1600x950.</translation>
    </message>
    <message>
        <source>Dark ground, whatever the system says.</source>
        <translation>Dunkler Grund, was immer das System sagt.</translation>
    </message>
    <message>
        <source>Light ground, whatever the system says.</source>
        <translation>Heller Grund, was immer das System sagt.</translation>
    </message>
    <message>
        <source>Open the first demo project.</source>
        <translation>Das erste Beispielprojekt öffnen.</translation>
    </message>
    <message>
        <source>Keep a report of what the window shows in FILE (JSON), for tests.</source>
        <translation>Für Tests in FILE (JSON) führen, was das Fenster zeigt.</translation>
    </message>
    <message>
        <source>A workbench for closing feedback loops on real equipment.</source>
        <translation>Eine Werkbank für Regelkreise an echten Anlagen.</translation>
    </message>
    <message>
        <source>A project or measurement file.</source>
        <translation>Eine Projekt- oder Messdatei.</translation>
    </message>
    <message>
        <source>Language of the window, en or de.</source>
        <translation>Sprache des Fensters, en oder de.</translation>
    </message>
    <message>
        <source>Write the review report of the one project as PDF to FILE and leave.</source>
        <translation>Den Prüfbericht des einen Projekts als PDF nach FILE schreiben und enden.</translation>
    </message>
    <message>
        <source>A date to print in the report.</source>
        <translation>Ein Datum, das im Bericht steht.</translation>
    </message>
</context>
</TS>
