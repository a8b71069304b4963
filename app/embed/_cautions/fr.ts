import type { CautionTexts } from "./caution-in";

/** Cautions in French. */
export const fr: CautionTexts = {
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Il s’agit d’une résistance en courant continu sous les hypothèses indiquées, et non d’une preuve de conformité : l’isolation, la tension de contact, la durée du défaut et la protection relèvent de la réglementation locale et d’un ingénieur agréé ou autrement compétent.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.":
    "Il s’agit d’une résistance en courant continu sous les hypothèses indiquées, et non d’une preuve de conformité : le courant admissible, l’échauffement et la protection relèvent de la réglementation locale et d’un ingénieur agréé ou autrement compétent.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Il s’agit d’une résistance en courant continu sous les hypothèses indiquées, et non d’une preuve de conformité : la tension de contact, la tension de pas, la durée du défaut et la protection relèvent de la réglementation locale et d’un ingénieur agréé ou autrement compétent.",
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.":
    "Il s’agit d’une résistance en courant continu sous les hypothèses indiquées, et non d’une preuve de conformité : le courant admissible, l’échauffement, l’isolation et la protection relèvent de la réglementation locale et d’un ingénieur agréé ou autrement compétent.",
  "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.":
    "La section nominale d’un câble est une désignation : sa résistance est fixée par les limites de sa norme, et non par cette aire.",
  "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.":
    "Isolation : la résistance d’un diélectrique dépend de l’humidité, de la température et de la durée sous tension ; ce n’est pas une preuve de sa rigidité.",
  "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.":
    "Résistance en courant continu seulement : à haute fréquence, le courant quitte l’âme pour la gaine, et la résistance est autre.",
  "A winding that carries current heats itself: give the temperature that it reaches.":
    "Un enroulement parcouru par un courant s’échauffe : indiquez la température qu’il atteint.",
  "A real contact has many small spots and films between them; this is one clean spot of known size.":
    "Un contact réel comporte de nombreuses petites taches et des films entre elles ; il s’agit ici d’une seule tache propre de taille connue.",
  "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.":
    "La densité de courant est élevée à la pointe d’une fente ; les résistances ajustées y dérivent et y cèdent en premier.",
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.":
    "La résistivité du sol varie avec l’humidité, la température, la saison et la profondeur, souvent de plus d’un facteur deux : mesurez-la sur place, et mesurez la prise de terre une fois réalisée.",
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.":
    "La conductivité varie à l’intérieur des éléments : les intégrales de l’encadrement sont estimées et celui-ci n’est pas prouvé.",
  "The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.":
    "La profondeur est hors de l’intervalle de 0,25 m à 2,5 m pour lequel l’IEEE Std 80 donne la formule.",
  "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.":
    "Une telle longueur de conducteur ne peut pas enclore cette aire : un simple anneau demande déjà 3,54 fois la racine de l’aire. Vérifiez l’aire et la longueur des conducteurs.",
  "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.":
    "Le quadrillage a moins d’environ 4 sur 4 mailles ; la formule y est grossière et son encadrement plus large.",
  "The rod is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Le piquet n’a que {0} diamètres de long ; la formule vaut à partir de 10, et son encadrement est ici plus large.",
  "The wire is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Le fil n’a que {0} diamètres de long ; la formule vaut à partir de 10, et son encadrement est ici plus large.",
  "The arm is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "Le bras n’a que {0} diamètres de long ; la formule vaut à partir de 10, et son encadrement est ici plus large.",
  "The rod is only {0} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.":
    "Le piquet n’a que {0} diamètres de long : ce n’est plus un piquet, et la valeur est grossière ; un hémisphère ou une plaque le décrit mieux.",
  "The depth is only {0} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.":
    "La profondeur n’est que de {0} diamètres du fil : si près de la surface, le sol est rarement homogène et le courant quitte le fil inégalement.",
  "The depth is more than half of the ring's radius: the published series no longer hold there; the value is computed without them.":
    "La profondeur dépasse la moitié du rayon de l’anneau : les séries publiées n’y sont plus valables ; la valeur est calculée sans elles.",
  "The depth is more than half of the length of an arm: the published series no longer hold there; the value is computed without them.":
    "La profondeur dépasse la moitié de la longueur d’un bras : les séries publiées n’y sont plus valables ; la valeur est calculée sans elles.",
  "The depth is more than half of half the length of the wire: the published series no longer hold there; the value is computed without them.":
    "La profondeur dépasse la moitié de la demi-longueur du fil : les séries publiées n’y sont plus valables ; la valeur est calculée sans elles.",
  "The rods are only {0} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.":
    "Les piquets ne sont distants que de {0} diamètres : ils agissent comme un seul piquet épais, et le courant les quitte par leurs côtés extérieurs.",
  "The rods are closer together than they are long; a wider spacing would lower the resistance.":
    "Les piquets sont plus proches que leur longueur ; un écartement plus grand abaisserait la résistance.",
  "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.":
    "Le fil est plus épais qu’un dixième du diamètre de l’anneau ; la formule vaut pour des anneaux minces, et son encadrement est ici plus large.",
  "Here the even current makes the value up to {0} % too high: the true resistance lies near the lower bound.":
    "Ici, le courant supposé uniforme donne une valeur trop élevée de {0} % au plus : la résistance vraie est proche de la borne inférieure.",
  "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.":
    "La largeur n’est pas inférieure au pas : les spires voisines se toucheraient et le courant prendrait un chemin plus court.",
  "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.":
    "Le pas est inférieur au diamètre du fil : les spires d’une même couche se chevaucheraient. N’indiquez le pas moyen de toutes les couches que si c’est voulu.",
  "The legs are short against their width: the long-leg formula may be off by up to {0} %.":
    "Les branches sont courtes par rapport à leur largeur : la formule pour branches longues peut s’écarter de {0} % au plus.",
  "Steep taper: the proved bounds lie {0} % apart and the value is their middle; a field solution on the outline narrows them.":
    "Forte conicité : les bornes prouvées sont distantes de {0} % et la valeur est leur milieu ; une solution du champ sur le contour les resserre.",
  "The integral over {0} reached a relative error of about {1} only; the bounds include it.":
    "L’intégrale sur {0} n’a atteint qu’une erreur relative d’environ {1} ; l’encadrement la comprend.",
  "An integral over the grading met its cap; the bounds are not proved.":
    "Une intégrale sur le gradient a atteint sa limite ; l’encadrement n’est pas prouvé.",
  "The resistivity of {0} may lie between {1} and {2} of the nominal value, which the bounds do not include: {3}":
    "La résistivité de {0} peut se situer entre {1} et {2} de la valeur nominale, ce que l’encadrement ne comprend pas : {3}",
  "Extrapolated: {0} is used at {1}, but holds at {2}.":
    "Extrapolé : {0} est utilisé à {1}, mais vaut à {2}.",
  "Extrapolated: {0} is used at {1}, but holds from {2} to {3}.":
    "Extrapolé : {0} est utilisé à {1}, mais vaut de {2} à {3}.",
  "The dopant density falls below {0} 1/cm³, where the mobility is taken as that of light doping.":
    "La densité de dopants descend sous {0} 1/cm³, où la mobilité est celle d’un faible dopage.",
  "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.":
    "Silicium vers 23 °C : la conductivité tirée de la densité de dopants ne suit pas la température de service.",
  "No input has a tolerance, so the uncertainty is zero.":
    "Aucune donnée n’a de tolérance ; l’incertitude est donc nulle.",
  "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.":
    "Les sensibilités sont celles de la formule ; la valeur est celle de la solution du champ sur le tracé nominal.",
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.":
    "La résistance n’est pas linéaire sur les tolérances : la propagation au premier ordre est ici grossière, et son intervalle est élargi aux valeurs des extrémités. La méthode de Monte-Carlo tient compte de la courbure.",
  "From {0} to {1} Ω·m by moisture, salts and grain.":
    "De {0} à {1} Ω·m selon l’humidité, les sels et la granulométrie.",
  "From {0} to {1} Ω·m by moisture and cement.": "De {0} à {1} Ω·m selon l’humidité et le ciment.",
  "From {0} to {1} Ω·m by moisture and age.": "De {0} à {1} Ω·m selon l’humidité et l’âge.",
  "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.":
    "Un ordre de grandeur : matériau sec, après une minute sous tension ; la chaleur, l’humidité et les charges l’abaissent fortement.",
  "Drinking water runs from about {0} to {1} Ω·m by its minerals and temperature.":
    "L’eau potable va d’environ {0} à {1} Ω·m selon ses minéraux et sa température.",
  "Salinities from about {0} to {1}.": "Salinités d’environ {0} à {1}.",
  "By carbon, manganese and silicon content (common practice, no source).":
    "Selon la teneur en carbone, manganèse et silicium (pratique courante, sans source).",
  "By tin and phosphorus content; bronzes in general run from {0} to {1} % IACS.":
    "Selon la teneur en étain et en phosphore ; les bronzes vont en général de {0} à {1} % IACS.",
  "Published values for the bulk alloy run from {0} to {1} µΩ·m; voids in a joint raise it.":
    "Les valeurs publiées pour l’alliage massif vont de {0} à {1} µΩ·m ; les vides d’un joint l’augmentent.",
  "Extruded and moulded grades run from {0} to {1} µΩ·m, and depend on the direction (common practice, no source).":
    "Les nuances extrudées et moulées vont de {0} à {1} µΩ·m et dépendent de la direction (pratique courante, sans source).",
  "Sputtered films run from {0} µΩ·m (hot, annealed) to {1} µΩ·m (cold, on plastic) (common practice, no source).":
    "Les couches pulvérisées vont de {0} µΩ·m (à chaud, recuites) à {1} µΩ·m (à froid, sur plastique) (pratique courante, sans source).",
};
