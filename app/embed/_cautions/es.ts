import type { CautionTexts } from "./caution-in";

/** Cautions in Spanish. */
export const es: CautionTexts = {
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Es una resistencia en corriente continua bajo los supuestos indicados y no acredita conformidad: el aislamiento, la tensión de contacto, la duración del defecto y la protección corresponden a la normativa local y a un ingeniero habilitado o igualmente competente.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.":
    "Es una resistencia en corriente continua bajo los supuestos indicados y no acredita conformidad: la intensidad admisible, el calentamiento y la protección corresponden a la normativa local y a un ingeniero habilitado o igualmente competente.",
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.":
    "Es una resistencia en corriente continua bajo los supuestos indicados y no acredita conformidad: las tensiones de contacto y de paso, la duración del defecto y la protección corresponden a la normativa local y a un ingeniero habilitado o igualmente competente.",
  "The result is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise, insulation and protection are for the local code and a licensed or otherwise competent engineer.":
    "Es una resistencia en corriente continua bajo los supuestos indicados y no acredita conformidad: la intensidad admisible, el calentamiento, el aislamiento y la protección corresponden a la normativa local y a un ingeniero habilitado o igualmente competente.",
  "The nominal section of a cable is a name: its resistance is fixed by the limits of its standard, not by this area.":
    "La sección nominal de un cable es una denominación: su resistencia la fijan los límites de su norma, no esta área.",
  "Insulation: the resistance of a dielectric depends on moisture, temperature and the time under voltage; this is no proof of its strength.":
    "Aislamiento: la resistencia de un dieléctrico depende de la humedad, la temperatura y el tiempo bajo tensión; esto no acredita su rigidez.",
  "A DC resistance only: at high frequency the current leaves the core for the cladding, and the resistance is another one.":
    "Solo resistencia en corriente continua: a alta frecuencia la corriente pasa del núcleo al revestimiento y la resistencia es otra.",
  "A winding that carries current heats itself: give the temperature that it reaches.":
    "Un devanado recorrido por corriente se calienta: indique la temperatura que alcanza.",
  "A real contact has many small spots and films between them; this is one clean spot of known size.":
    "Un contacto real tiene muchos puntos pequeños y películas entre ellos; este es un único punto limpio de tamaño conocido.",
  "The current density at the tip of a slit is high; trimmed resistors drift and fail there first.":
    "La densidad de corriente es alta en la punta de una ranura; las resistencias ajustadas derivan y fallan primero allí.",
  "The resistivity of soil changes with moisture, temperature, season and depth, often by more than a factor of two: measure it at the site, and measure the electrode once it is built.":
    "La resistividad del terreno cambia con la humedad, la temperatura, la estación y la profundidad, a menudo en más de un factor de dos: mídala en el lugar y mida el electrodo una vez instalado.",
  "The conductivity varies inside the elements, so the integrals behind the bounds are estimated and the bracket is not proved.":
    "La conductividad varía dentro de los elementos: las integrales de las cotas son estimadas y las cotas no están demostradas.",
  "The depth lies outside 0.25 m to 2.5 m, for which IEEE Std 80 states the formula.":
    "La profundidad está fuera de 0,25 m a 2,5 m, para los que IEEE Std 80 da la fórmula.",
  "So little conductor cannot enclose that area: even a ring of it takes 3.54 times the root of the area. Check area and conductor length.":
    "Tan poco conductor no puede rodear esa área: ya un anillo necesita 3,54 veces la raíz del área. Compruebe el área y la longitud de los conductores.",
  "The grid has fewer meshes than about 4 by 4; the formula is rough there, and its bounds are wider.":
    "La malla tiene menos de unas 4 por 4 retículas; la fórmula es allí aproximada y sus cotas más amplias.",
  "The rod is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "La pica solo tiene {0} diámetros de largo; la fórmula es para 10 o más, y sus cotas son aquí más amplias.",
  "The wire is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "El hilo solo tiene {0} diámetros de largo; la fórmula es para 10 o más, y sus cotas son aquí más amplias.",
  "The arm is only {0} diameters long; the formula is meant for 10 and more, and its bounds are wider here.":
    "El brazo solo tiene {0} diámetros de largo; la fórmula es para 10 o más, y sus cotas son aquí más amplias.",
  "The rod is only {0} diameters long: it is no longer a rod, and the value is a rough one; a hemisphere or a plate describes it better.":
    "La pica solo tiene {0} diámetros de largo: ya no es una pica y el valor es aproximado; una semiesfera o una placa la describe mejor.",
  "The depth is only {0} wire diameters: so near the surface the soil is rarely uniform, and the current leaves the wire unevenly.":
    "La profundidad es de solo {0} diámetros del hilo: tan cerca de la superficie el terreno rara vez es uniforme y la corriente sale del hilo de forma desigual.",
  "The depth is more than half of the ring's radius: the published series no longer hold there; the value is computed without them.":
    "La profundidad supera la mitad del radio del anillo: las series publicadas ya no valen allí; el valor se calcula sin ellas.",
  "The depth is more than half of the length of an arm: the published series no longer hold there; the value is computed without them.":
    "La profundidad supera la mitad de la longitud de un brazo: las series publicadas ya no valen allí; el valor se calcula sin ellas.",
  "The depth is more than half of half the length of the wire: the published series no longer hold there; the value is computed without them.":
    "La profundidad supera la mitad de la semilongitud del hilo: las series publicadas ya no valen allí; el valor se calcula sin ellas.",
  "The rods are only {0} diameters apart: they act like one thick rod, and the current leaves them on their outer sides.":
    "Las picas distan solo {0} diámetros: actúan como una sola pica gruesa y la corriente sale por sus lados exteriores.",
  "The rods are closer together than they are long; a wider spacing would lower the resistance.":
    "Las picas están más próximas que su longitud; una separación mayor bajaría la resistencia.",
  "The wire is thicker than a tenth of the ring's diameter; the formula is meant for thin rings, and its bounds are wider here.":
    "El hilo es más grueso que una décima parte del diámetro del anillo; la fórmula es para anillos delgados y sus cotas son aquí más amplias.",
  "Here the even current makes the value up to {0} % too high: the true resistance lies near the lower bound.":
    "Aquí la corriente uniforme hace el valor hasta un {0} % demasiado alto: la resistencia verdadera está cerca de la cota inferior.",
  "The width is not less than the pitch: neighbouring turns would touch, and the current would take a shorter way.":
    "La anchura no es menor que el paso: las espiras vecinas se tocarían y la corriente tomaría un camino más corto.",
  "The pitch is smaller than the wire diameter: the turns of one layer would run into each other. Give the mean pitch of all layers only if that is meant.":
    "El paso es menor que el diámetro del hilo: las espiras de una capa se solaparían. Indique el paso medio de todas las capas solo si es lo que se quiere.",
  "The legs are short against their width: the long-leg formula may be off by up to {0} %.":
    "Los tramos son cortos respecto a su anchura: la fórmula de tramos largos puede desviarse hasta un {0} %.",
  "Steep taper: the proved bounds lie {0} % apart and the value is their middle; a field solution on the outline narrows them.":
    "Conicidad fuerte: las cotas demostradas distan un {0} % y el valor es su punto medio; una solución del campo sobre el contorno las estrecha.",
  "The integral over {0} reached a relative error of about {1} only; the bounds include it.":
    "La integral sobre {0} solo alcanzó un error relativo de unos {1}; las cotas lo incluyen.",
  "An integral over the grading met its cap; the bounds are not proved.":
    "Una integral sobre la gradación alcanzó su tope; las cotas no están demostradas.",
  "The resistivity of {0} may lie between {1} and {2} of the nominal value, which the bounds do not include: {3}":
    "La resistividad de {0} puede estar entre {1} y {2} del valor nominal, lo que las cotas no incluyen: {3}",
  "Extrapolated: {0} is used at {1}, but holds at {2}.": "Extrapolado: {0} se usa a {1}, pero vale a {2}.",
  "Extrapolated: {0} is used at {1}, but holds from {2} to {3}.":
    "Extrapolado: {0} se usa a {1}, pero vale de {2} a {3}.",
  "The dopant density falls below {0} 1/cm³, where the mobility is taken as that of light doping.":
    "La densidad de dopantes baja de {0} 1/cm³, donde se toma la movilidad del dopado débil.",
  "Silicon near 23 °C: the conductivity by dopant density does not follow the operating temperature.":
    "Silicio a unos 23 °C: la conductividad por densidad de dopantes no sigue la temperatura de servicio.",
  "No input has a tolerance, so the uncertainty is zero.":
    "Ningún dato tiene tolerancia, así que la incertidumbre es cero.",
  "The sensitivities are those of the formula; the value is that of the field solution on the nominal plan.":
    "Las sensibilidades son las de la fórmula; el valor es el de la solución del campo sobre el plano nominal.",
  "The resistance is not straight over the tolerances, so first-order propagation is rough here; its range is widened to the values at their ends. monte-carlo takes the bend into account.":
    "La resistencia no es lineal en las tolerancias: la propagación de primer orden es aquí aproximada y su intervalo se amplía a los valores de los extremos. El método de Monte Carlo tiene en cuenta la curvatura.",
  "From {0} to {1} Ω·m by moisture, salts and grain.":
    "De {0} a {1} Ω·m según la humedad, las sales y la granulometría.",
  "From {0} to {1} Ω·m by moisture and cement.": "De {0} a {1} Ω·m según la humedad y el cemento.",
  "From {0} to {1} Ω·m by moisture and age.": "De {0} a {1} Ω·m según la humedad y la edad.",
  "An order of magnitude: dry material, after a minute under voltage; heat, moisture and fillers lower it much.":
    "Un orden de magnitud: material seco, tras un minuto bajo tensión; el calor, la humedad y las cargas la bajan mucho.",
  "Drinking water runs from about {0} to {1} Ω·m by its minerals and temperature.":
    "El agua potable va de unos {0} a {1} Ω·m según sus minerales y su temperatura.",
  "Salinities from about {0} to {1}.": "Salinidades de unos {0} a {1}.",
  "By carbon, manganese and silicon content (common practice, no source).":
    "Según el contenido de carbono, manganeso y silicio (práctica común, sin fuente).",
  "By tin and phosphorus content; bronzes in general run from {0} to {1} % IACS.":
    "Según el contenido de estaño y fósforo; los bronces van en general de {0} a {1} % IACS.",
  "Published values for the bulk alloy run from {0} to {1} µΩ·m; voids in a joint raise it.":
    "Los valores publicados de la aleación maciza van de {0} a {1} µΩ·m; los huecos de una unión la aumentan.",
  "Extruded and moulded grades run from {0} to {1} µΩ·m, and depend on the direction (common practice, no source).":
    "Los tipos extruidos y moldeados van de {0} a {1} µΩ·m y dependen de la dirección (práctica común, sin fuente).",
  "Sputtered films run from {0} µΩ·m (hot, annealed) to {1} µΩ·m (cold, on plastic) (common practice, no source).":
    "Las películas pulverizadas van de {0} µΩ·m (en caliente, recocidas) a {1} µΩ·m (en frío, sobre plástico) (práctica común, sin fuente).",
};
