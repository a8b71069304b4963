import type { Language } from "./language";

/** Why a frame shows no calculator. */
export type CardReason = "not-found" | "withdrawn";

const TEXTS: Readonly<
  Record<Language, Readonly<Record<CardReason, { readonly title: string; readonly text: string }>>>
> = {
  en: {
    "not-found": {
      title: "There is no such calculator",
      text: "The address of this frame names none that is published. Whoever keeps this page can copy the snippet again.",
    },
    withdrawn: {
      title: "This calculator was withdrawn",
      text: "The team that owns it has taken it off all pages. Whoever keeps this page can remove the frame.",
    },
  },
  de: {
    "not-found": {
      title: "Diesen Rechner gibt es nicht",
      text: "Unter dieser Adresse ist keiner veröffentlicht. Wer diese Seite pflegt, kann den Baustein neu kopieren.",
    },
    withdrawn: {
      title: "Dieser Rechner wurde zurückgezogen",
      text: "Das zuständige Team hat ihn von allen Seiten genommen. Wer diese Seite pflegt, kann den Rahmen entfernen.",
    },
  },
  fr: {
    "not-found": {
      title: "Ce calculateur n’existe pas",
      text: "Aucun n’est publié à cette adresse. La personne qui tient cette page peut copier à nouveau l’extrait.",
    },
    withdrawn: {
      title: "Ce calculateur a été retiré",
      text: "L’équipe qui le possède l’a retiré de toutes les pages. La personne qui tient cette page peut supprimer le cadre.",
    },
  },
  es: {
    "not-found": {
      title: "Esta calculadora no existe",
      text: "No hay ninguna publicada en esta dirección. Quien mantiene esta página puede copiar el fragmento de nuevo.",
    },
    withdrawn: {
      title: "Esta calculadora se ha retirado",
      text: "El equipo propietario la ha quitado de todas las páginas. Quien mantiene esta página puede quitar el marco.",
    },
  },
  sv: {
    "not-found": {
      title: "Den här kalkylatorn finns inte",
      text: "Ingen är publicerad på den här adressen. Den som sköter sidan kan kopiera koden på nytt.",
    },
    withdrawn: {
      title: "Den här kalkylatorn har dragits tillbaka",
      text: "Teamet som äger den har tagit bort den från alla sidor. Den som sköter sidan kan ta bort ramen.",
    },
  },
  ja: {
    "not-found": {
      title: "この計算ツールはありません",
      text: "このアドレスで公開されているものはありません。ページの管理者はコードをコピーし直してください。",
    },
    withdrawn: {
      title: "この計算ツールは公開を終了しました",
      text: "所有するチームがすべてのページから取り下げました。ページの管理者はこの枠を取り除いてください。",
    },
  },
};

interface Card {
  readonly reason: CardReason;
  /** As the frame's address has it; told to the page around only where it has an id's form. */
  readonly embedId: string;
  readonly language: Language;
  readonly theme: "host" | "light" | "dark";
  readonly nonce: string;
}

/** A document that says calmly why there is no calculator, and tells the page around how high it is. */
export function cardDocument({ reason, embedId, language, theme, nonce }: Card): string {
  const { title, text } = TEXTS[language][reason];
  const id = /^emb_[0-9A-Za-z]{16}$/.test(embedId) ? embedId : "";
  const scheme = theme === "host" ? "light dark" : theme;
  return `<!doctype html>
<html lang="${language}">
<head>
<meta charset="utf-8">
<meta name="viewport" content="width=device-width, initial-scale=1">
<title>${title}</title>
<style nonce="${nonce}">
:root { color-scheme: ${scheme}; }
body { margin: 0; background: light-dark(#faf8f3, #14181a); color: light-dark(#1b2226, #ece8df);
  font: 1rem/1.6 system-ui, sans-serif; }
main { border: 1px solid light-dark(#857f73, #7a8388); border-radius: 2px; padding: 1rem;
  background: light-dark(#ffffff, #1c2124); }
h1 { font-size: 1.1875rem; line-height: 1.4; margin: 0 0 0.25rem; }
p { margin: 0; color: light-dark(#566067, #a3abaf); font-size: 0.875rem; }
</style>
</head>
<body>
<main><h1>${title}</h1><p>${text}</p></main>
<script nonce="${nonce}">
if (parent !== window) {
  var say = function (type, data) {
    parent.postMessage({ source: "rhoform", version: 1, type: type, embed: "${id}", data: data }, "*");
  };
  say("size", { height: Math.ceil(document.documentElement.getBoundingClientRect().height) });
  say("error", { code: "${reason}", message: document.title });
}
</script>
</body>
</html>
`;
}
