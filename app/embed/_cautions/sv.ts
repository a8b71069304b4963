import type { CautionTexts } from "./caution-in";

/** Cautions in Swedish. */
export const sv: CautionTexts = {
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Detta är en likströmsresistans under angivna antaganden och inget bevis på överensstämmelse: isolation, beröringsspänning, felets varaktighet och skydd är en fråga för lokala föreskrifter och en behörig eller på annat sätt kompetent ingenjör.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.":
    "Detta är en likströmsresistans under angivna antaganden och inget bevis på överensstämmelse: strömbelastningsförmåga, temperaturstegring och skydd är en fråga för lokala föreskrifter och en behörig eller på annat sätt kompetent ingenjör.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Detta är en likströmsresistans under angivna antaganden och inget bevis på överensstämmelse: berörings- och stegspänning, felets varaktighet och skydd är en fråga för lokala föreskrifter och en behörig eller på annat sätt kompetent ingenjör.",
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.":
    "Detta är en likströmsresistans under angivna antaganden och inget bevis på överensstämmelse: strömbelastningsförmåga, temperaturstegring, isolation och skydd är en fråga för lokala föreskrifter och en behörig eller på annat sätt kompetent ingenjör.",
  "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.":
    "En kabels nominella area är en beteckning: dess resistans bestäms av gränsvärdena i kabelns standard, inte av denna area.",
  "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.":
    "Isolation: ett dielektrikums resistans beror på fukt, temperatur och tiden under spänning; detta är inget bevis på dess hållfasthet.",
  "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.":
    "Endast likströmsresistans: vid hög frekvens lämnar strömmen kärnan för manteln, och resistansen blir en annan.",
  "A winding that carries current heats itself: give the temperature that it reaches.":
    "En strömförande lindning värms upp: ange den temperatur som den når.",
  "A real contact has many small spots and films between them; this is one clean spot of known size.":
    "En verklig kontakt har många små fläckar med filmer emellan; detta är en enda ren fläck av känd storlek.",
  "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.":
    "Strömtätheten är hög vid slitsens spets; trimmade motstånd driver och går sönder där först.",
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.":
    "Markens resistivitet ändras med fukt, temperatur, årstid och djup, ofta med mer än en faktor två: mät den på platsen, och mät jordtaget när det är byggt.",
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.":
    "Konduktiviteten varierar inuti elementen, så integralerna bakom gränserna är uppskattade och gränserna inte bevisade.",
  "The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.":
    "Djupet ligger utanför 0,25 m till 2,5 m, för vilka IEEE Std 80 anger formeln.",
  "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.":
    "Så lite ledare kan inte omsluta den ytan: redan en ring kräver 3,54 gånger roten ur arean. Kontrollera area och ledarlängd.",
  "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.":
    "Nätet har färre än ungefär 4 gånger 4 maskor; formeln är grov där, och dess gränser är vidare.",
  "The rod is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Jordspettet är bara {0} diametrar långt; formeln är avsedd för 10 och mer, och dess gränser är vidare här.",
  "The wire is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Tråden är bara {0} diametrar lång; formeln är avsedd för 10 och mer, och dess gränser är vidare här.",
  "The arm is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Armen är bara {0} diametrar lång; formeln är avsedd för 10 och mer, och dess gränser är vidare här.",
  "The rod is only {0} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.":
    "Jordspettet är bara {0} diametrar långt: det är inte längre ett spett och värdet är grovt; en halvsfär eller en platta beskriver det bättre.",
  "The depth is only {0} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.":
    "Djupet är bara {0} tråddiametrar: så nära ytan är marken sällan homogen, och strömmen lämnar tråden ojämnt.",
  "The depth is more than half of the ring's radius: the published series no longer hold there; the value is computed without them.":
    "Djupet är mer än hälften av ringens radie: de publicerade serierna gäller inte längre där; värdet beräknas utan dem.",
  "The depth is more than half of the length of an arm: the published series no longer hold there; the value is computed without them.":
    "Djupet är mer än hälften av en arms längd: de publicerade serierna gäller inte längre där; värdet beräknas utan dem.",
  "The depth is more than half of half the length of the wire: the published series no longer hold there; the value is computed without them.":
    "Djupet är mer än hälften av trådens halva längd: de publicerade serierna gäller inte längre där; värdet beräknas utan dem.",
  "The rods are only {0} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.":
    "Jordspetten står bara {0} diametrar isär: de verkar som ett enda tjockt spett, och strömmen lämnar dem på utsidorna.",
  "The rods are closer together than they are long; a wider spacing would lower the resistance.":
    "Jordspetten står tätare än de är långa; ett större avstånd skulle sänka resistansen.",
  "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.":
    "Tråden är tjockare än en tiondel av ringens diameter; formeln är avsedd för tunna ringar, och dess gränser är vidare här.",
  "Here the even current makes the value up to {0} % too high: the true resistance lies near the lower bound.":
    "Här gör den jämna strömmen värdet upp till {0} % för högt: den verkliga resistansen ligger nära den undre gränsen.",
  "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.":
    "Bredden är inte mindre än stigningen: intilliggande varv skulle röra vid varandra, och strömmen ta en kortare väg.",
  "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.":
    "Stigningen är mindre än tråddiametern: varven i ett lager skulle gå in i varandra. Ange medelstigningen för alla lager bara om det är avsikten.",
  "The legs are short against their width: the long-leg formula may be off by up to {0} %.":
    "Benen är korta mot sin bredd: formeln för långa ben kan avvika med upp till {0} %.",
  "Steep taper: the proved bounds lie {0} % apart and the value is their middle; a field solution on the outline narrows them.":
    "Brant avsmalning: de bevisade gränserna ligger {0} % isär och värdet är mitt emellan; en fältlösning på konturen snävar in dem.",
  "The integral over {0} reached a relative error of about {1} only; the bounds include it.":
    "Integralen över {0} nådde bara ett relativt fel på ungefär {1}; gränserna innehåller det.",
  "An integral over the grading met its cap; the bounds are not proved.":
    "En integral över graderingen nådde sitt tak; gränserna är inte bevisade.",
  "The resistivity of {0} may lie between {1} and {2} of the nominal value, which the bounds do not include: {3}":
    "Resistiviteten hos {0} kan ligga mellan {1} och {2} av det nominella värdet, vilket gränserna inte innehåller: {3}",
  "Extrapolated: {0} is used at {1}, but holds at {2}.":
    "Extrapolerat: {0} används vid {1}, men gäller vid {2}.",
  "Extrapolated: {0} is used at {1}, but holds from {2} to {3}.":
    "Extrapolerat: {0} används vid {1}, men gäller från {2} till {3}.",
  "The dopant density falls below {0} 1/cm³, where the mobility is taken as that of light doping.":
    "Dopningstätheten faller under {0} 1/cm³, där rörligheten tas som vid svag dopning.",
  "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.":
    "Kisel vid ungefär 23 °C: konduktiviteten ur dopningstätheten följer inte drifttemperaturen.",
  "No input has a tolerance, so the uncertainty is zero.":
    "Inga indata har någon tolerans, så osäkerheten är noll.",
  "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.":
    "Känsligheterna är formelns; värdet är fältlösningens på den nominella konturen.",
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.":
    "Resistansen är inte rak över toleranserna, så felfortplantning av första ordningen är grov här; dess område är utvidgat till värdena vid ändarna. Monte Carlo tar hänsyn till krökningen.",
  "From {0} to {1} Ω·m by moisture, salts and grain.":
    "Från {0} till {1} Ω·m beroende på fukt, salter och kornstorlek.",
  "From {0} to {1} Ω·m by moisture and cement.": "Från {0} till {1} Ω·m beroende på fukt och cement.",
  "From {0} to {1} Ω·m by moisture and age.": "Från {0} till {1} Ω·m beroende på fukt och ålder.",
  "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.":
    "En storleksordning: torrt material efter en minut under spänning; värme, fukt och fyllmedel sänker den mycket.",
  "Drinking water runs from about {0} to {1} Ω·m by its minerals and temperature.":
    "Dricksvatten går från ungefär {0} till {1} Ω·m beroende på mineraler och temperatur.",
  "Salinities from about {0} to {1}.": "Salthalter från ungefär {0} till {1}.",
  "By carbon, manganese and silicon content (common practice, no source).":
    "Beroende på halten av kol, mangan och kisel (vanlig praxis, utan källa).",
  "By tin and phosphorus content; bronzes in general run from {0} to {1} % IACS.":
    "Beroende på halten av tenn och fosfor; bronser går i allmänhet från {0} till {1} % IACS.",
  "Published values for the bulk alloy run from {0} to {1} µΩ·m; voids in a joint raise it.":
    "Publicerade värden för den massiva legeringen går från {0} till {1} µΩ·m; hålrum i en fog höjer den.",
  "Extruded and moulded grades run from {0} to {1} µΩ·m, and depend on the direction (common practice, no source).":
    "Extruderade och pressade sorter går från {0} till {1} µΩ·m och beror på riktningen (vanlig praxis, utan källa).",
  "Sputtered films run from {0} µΩ·m (hot, annealed) to {1} µΩ·m (cold, on plastic) (common practice, no source).":
    "Sputtrade skikt går från {0} µΩ·m (varmt, glödgat) till {1} µΩ·m (kallt, på plast) (vanlig praxis, utan källa).",
};
