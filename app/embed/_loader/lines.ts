/** What stands in a frame's place: the frame itself cannot say it. */
interface Lines {
  readonly title: string;
  readonly refused: string;
  readonly policy: string;
  readonly away: string;
  readonly again: string;
}

const LINES: Readonly<Record<string, Lines>> = {
  en: {
    title: "Calculator",
    refused: "This page may not show the calculator. The team that owns it can add this page’s address:",
    policy: "This page’s own security policy (frame-src) does not allow frames of",
    away: "The calculator cannot be reached at the moment.",
    again: "Try again",
  },
  de: {
    title: "Rechner",
    refused: "Diese Seite darf den Rechner nicht zeigen. Das zuständige Team kann ihre Adresse eintragen:",
    policy: "Die Sicherheitsrichtlinie dieser Seite (frame-src) erlaubt keine Rahmen von",
    away: "Der Rechner ist zurzeit nicht erreichbar.",
    again: "Noch einmal versuchen",
  },
  fr: {
    title: "Calculateur",
    refused:
      "Cette page ne peut pas afficher le calculateur. L’équipe qui le possède peut ajouter son adresse :",
    policy: "La politique de sécurité de cette page (frame-src) n’autorise pas les cadres de",
    away: "Le calculateur est injoignable pour le moment.",
    again: "Réessayer",
  },
  es: {
    title: "Calculadora",
    refused: "Esta página no puede mostrar la calculadora. El equipo propietario puede añadir su dirección:",
    policy: "La política de seguridad de esta página (frame-src) no permite marcos de",
    away: "No se puede contactar con la calculadora en este momento.",
    again: "Intentar de nuevo",
  },
  sv: {
    title: "Kalkylator",
    refused: "Den här sidan får inte visa kalkylatorn. Teamet som äger den kan lägga till sidans adress:",
    policy: "Sidans egen säkerhetspolicy (frame-src) tillåter inga ramar från",
    away: "Kalkylatorn kan inte nås just nu.",
    again: "Försök igen",
  },
  ja: {
    title: "計算ツール",
    refused: "このページでは計算ツールを表示できません。所有するチームが次のアドレスを追加できます：",
    policy: "このページのセキュリティポリシー（frame-src）が次のフレームを許可していません：",
    away: "計算ツールに現在接続できません。",
    again: "もう一度試す",
  },
};

/** The lines in a page's language, a BCP 47 tag; English where it is none of ours. */
export function linesFor(tag: string): Lines {
  return LINES[tag.split("-")[0].toLowerCase()] ?? LINES.en;
}
