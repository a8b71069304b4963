import type { CautionTexts } from "./caution-in";

/** Cautions in German. */
export const de: CautionTexts = {
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Dies ist ein Gleichstromwiderstand unter den genannten Annahmen und kein Konformitätsnachweis: Isolation, Berührungsspannung, Fehlerdauer und Schutzmaßnahmen sind Sache der örtlich geltenden Vorschriften und einer zugelassenen oder anderweitig befähigten Fachkraft.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.":
    "Dies ist ein Gleichstromwiderstand unter den genannten Annahmen und kein Konformitätsnachweis: Strombelastbarkeit, Erwärmung und Schutzmaßnahmen sind Sache der örtlich geltenden Vorschriften und einer zugelassenen oder anderweitig befähigten Fachkraft.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Dies ist ein Gleichstromwiderstand unter den genannten Annahmen und kein Konformitätsnachweis: Berührungs- und Schrittspannung, Fehlerdauer und Schutzmaßnahmen sind Sache der örtlich geltenden Vorschriften und einer zugelassenen oder anderweitig befähigten Fachkraft.",
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.":
    "Dies ist ein Gleichstromwiderstand unter den genannten Annahmen und kein Konformitätsnachweis: Strombelastbarkeit, Erwärmung, Isolation und Schutzmaßnahmen sind Sache der örtlich geltenden Vorschriften und einer zugelassenen oder anderweitig befähigten Fachkraft.",
  "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.":
    "Der Nennquerschnitt eines Kabels ist ein Name: Seinen Widerstand legen die Grenzwerte seiner Norm fest, nicht diese Fläche.",
  "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.":
    "Isolation: Der Widerstand eines Dielektrikums hängt von Feuchte, Temperatur und Dauer der Spannung ab; dies ist kein Nachweis seiner Spannungsfestigkeit.",
  "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.":
    "Nur ein Gleichstromwiderstand: Bei hoher Frequenz weicht der Strom vom Kern in den Mantel aus, und der Widerstand ist ein anderer.",
  "A winding that carries current heats itself: give the temperature that it reaches.":
    "Eine stromführende Wicklung erwärmt sich: Geben Sie die Temperatur an, die sie erreicht.",
  "A real contact has many small spots and films between them; this is one clean spot of known size.":
    "Ein wirklicher Kontakt hat viele kleine Kontaktstellen und Fremdschichten dazwischen; dies ist eine einzige saubere Stelle bekannter Größe.",
  "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.":
    "An der Spitze eines Schlitzes ist die Stromdichte hoch; abgeglichene Widerstände driften und versagen dort zuerst.",
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.":
    "Der spezifische Widerstand des Erdbodens ändert sich mit Feuchte, Temperatur, Jahreszeit und Tiefe, oft um mehr als das Doppelte: Messen Sie ihn vor Ort, und messen Sie den Erder, wenn er gebaut ist.",
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.":
    "Die Leitfähigkeit ändert sich innerhalb der Elemente; die Integrale hinter den Schranken sind daher geschätzt und die Schranken nicht bewiesen.",
  "The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.":
    "Die Tiefe liegt außerhalb von 0,25 m bis 2,5 m, wofür IEEE Std 80 die Formel angibt.",
  "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.":
    "So wenig Leiter kann diese Fläche nicht umschließen: Schon ein Ring braucht das 3,54-Fache der Wurzel der Fläche. Prüfen Sie Fläche und Leiterlänge.",
  "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.":
    "Das Netz hat weniger als etwa 4 mal 4 Maschen; die Formel ist dort grob, und ihre Schranken sind weiter.",
  "The rod is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Der Erder ist nur {0} Durchmesser lang; die Formel ist für 10 und mehr gedacht, und ihre Schranken sind hier weiter.",
  "The wire is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Der Draht ist nur {0} Durchmesser lang; die Formel ist für 10 und mehr gedacht, und ihre Schranken sind hier weiter.",
  "The arm is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Der Strahl ist nur {0} Durchmesser lang; die Formel ist für 10 und mehr gedacht, und ihre Schranken sind hier weiter.",
  "The rod is only {0} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.":
    "Der Erder ist nur {0} Durchmesser lang: Er ist kein Stab mehr, und der Wert ist grob; eine Halbkugel oder Platte beschreibt ihn besser.",
  "The depth is only {0} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.":
    "Die Tiefe beträgt nur {0} Drahtdurchmesser: So nahe der Oberfläche ist der Boden selten gleichmäßig, und der Strom verlässt den Draht ungleichmäßig.",
  "The depth is more than half of the ring's radius: the published series no longer hold there; the value is computed without them.":
    "Die Tiefe ist mehr als die Hälfte des Ringradius: Die veröffentlichten Reihen gelten dort nicht mehr; der Wert ist ohne sie berechnet.",
  "The depth is more than half of the length of an arm: the published series no longer hold there; the value is computed without them.":
    "Die Tiefe ist mehr als die Hälfte der Strahlenlänge: Die veröffentlichten Reihen gelten dort nicht mehr; der Wert ist ohne sie berechnet.",
  "The depth is more than half of half the length of the wire: the published series no longer hold there; the value is computed without them.":
    "Die Tiefe ist mehr als die Hälfte der halben Drahtlänge: Die veröffentlichten Reihen gelten dort nicht mehr; der Wert ist ohne sie berechnet.",
  "The rods are only {0} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.":
    "Die Erder stehen nur {0} Durchmesser auseinander: Sie wirken wie ein dicker Stab, und der Strom verlässt sie an ihren Außenseiten.",
  "The rods are closer together than they are long; a wider spacing would lower the resistance.":
    "Die Erder stehen enger beieinander, als sie lang sind; ein größerer Abstand würde den Widerstand senken.",
  "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.":
    "Der Draht ist dicker als ein Zehntel des Ringdurchmessers; die Formel ist für dünne Ringe gedacht, und ihre Schranken sind hier weiter.",
  "Here the even current makes the value up to {0} % too high: the true resistance lies near the lower bound.":
    "Hier macht der gleichmäßig angesetzte Strom den Wert um bis zu {0} % zu hoch: Der wahre Widerstand liegt nahe der unteren Schranke.",
  "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.":
    "Die Breite ist nicht kleiner als die Steigung: Benachbarte Windungen würden sich berühren, und der Strom nähme einen kürzeren Weg.",
  "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.":
    "Die Steigung ist kleiner als der Drahtdurchmesser: Die Windungen einer Lage würden ineinander laufen. Geben Sie die mittlere Steigung aller Lagen nur an, wenn das gemeint ist.",
  "The legs are short against their width: the long-leg formula may be off by up to {0} %.":
    "Die Schenkel sind kurz gegen ihre Breite: Die Formel für lange Schenkel kann um bis zu {0} % abweichen.",
  "Steep taper: the proved bounds lie {0} % apart and the value is their middle; a field solution on the outline narrows them.":
    "Steile Verjüngung: Die bewiesenen Schranken liegen {0} % auseinander, und der Wert ist ihre Mitte; eine Feldlösung auf dem Umriss verengt sie.",
  "The integral over {0} reached a relative error of about {1} only; the bounds include it.":
    "Das Integral über {0} erreichte nur einen relativen Fehler von etwa {1}; die Schranken enthalten ihn.",
  "An integral over the grading met its cap; the bounds are not proved.":
    "Ein Integral über den Verlauf erreichte seine Obergrenze; die Schranken sind nicht bewiesen.",
  "The resistivity of {0} may lie between {1} and {2} of the nominal value, which the bounds do not include: {3}":
    "Der spezifische Widerstand von {0} kann zwischen {1} und {2} des Nennwerts liegen, was die Schranken nicht enthalten: {3}",
  "Extrapolated: {0} is used at {1}, but holds at {2}.":
    "Extrapoliert: {0} wird bei {1} benutzt, gilt aber bei {2}.",
  "Extrapolated: {0} is used at {1}, but holds from {2} to {3}.":
    "Extrapoliert: {0} wird bei {1} benutzt, gilt aber von {2} bis {3}.",
  "The dopant density falls below {0} 1/cm³, where the mobility is taken as that of light doping.":
    "Die Dotierungsdichte fällt unter {0} 1/cm³; dort gilt die Beweglichkeit schwacher Dotierung.",
  "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.":
    "Silizium bei etwa 23 °C: Die Leitfähigkeit aus der Dotierungsdichte folgt der Betriebstemperatur nicht.",
  "No input has a tolerance, so the uncertainty is zero.":
    "Keine Eingabe hat eine Toleranz; die Unsicherheit ist daher null.",
  "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.":
    "Die Empfindlichkeiten sind die der Formel; der Wert ist der der Feldlösung auf dem Nennumriss.",
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.":
    "Der Widerstand verläuft über die Toleranzen nicht gerade; die lineare Fortpflanzung ist hier grob, und ihr Bereich ist bis zu den Werten an den Enden erweitert. Das Monte-Carlo-Verfahren berücksichtigt die Krümmung.",
  "From {0} to {1} Ω·m by moisture, salts and grain.":
    "Von {0} bis {1} Ω·m je nach Feuchte, Salzen und Körnung.",
  "From {0} to {1} Ω·m by moisture and cement.": "Von {0} bis {1} Ω·m je nach Feuchte und Zement.",
  "From {0} to {1} Ω·m by moisture and age.": "Von {0} bis {1} Ω·m je nach Feuchte und Alter.",
  "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.":
    "Eine Größenordnung: trockenes Material nach einer Minute unter Spannung; Wärme, Feuchte und Füllstoffe senken ihn stark.",
  "Drinking water runs from about {0} to {1} Ω·m by its minerals and temperature.":
    "Trinkwasser reicht je nach Mineralien und Temperatur von etwa {0} bis {1} Ω·m.",
  "Salinities from about {0} to {1}.": "Salzgehalte von etwa {0} bis {1}.",
  "By carbon, manganese and silicon content (common practice, no source).":
    "Je nach Gehalt an Kohlenstoff, Mangan und Silizium (Praxiswert, ohne Quelle).",
  "By tin and phosphorus content; bronzes in general run from {0} to {1} % IACS.":
    "Je nach Gehalt an Zinn und Phosphor; Bronzen reichen allgemein von {0} bis {1} % IACS.",
  "Published values for the bulk alloy run from {0} to {1} µΩ·m; voids in a joint raise it.":
    "Veröffentlichte Werte der massiven Legierung reichen von {0} bis {1} µΩ·m; Hohlräume in der Lötstelle erhöhen ihn.",
  "Extruded and moulded grades run from {0} to {1} µΩ·m, and depend on the direction (common practice, no source).":
    "Stranggepresste und geformte Sorten reichen von {0} bis {1} µΩ·m und sind richtungsabhängig (Praxiswert, ohne Quelle).",
  "Sputtered films run from {0} µΩ·m (hot, annealed) to {1} µΩ·m (cold, on plastic) (common practice, no source).":
    "Gesputterte Schichten reichen von {0} µΩ·m (heiß, getempert) bis {1} µΩ·m (kalt, auf Kunststoff) (Praxiswert, ohne Quelle).",
};
