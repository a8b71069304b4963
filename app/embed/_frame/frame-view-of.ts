import "server-only";
import { readSetting } from "@/db/queries/settings";
import { frameDrawing } from "@/app/api/embed/_server/frame-drawing";
import { readGeometry } from "@/app/(site)/calculate/_server/geometry";
import type { EmbedDefinition } from "@/lib/embeds/definition";
import { widgetDimensions } from "@/lib/embeds/enforce";
import { definitionInputs } from "@/lib/embeds/inputs";
import { speechOf } from "@/lib/embeds/language";
import type { ShownEmbed } from "@/lib/embeds/show-embed";
import { issueEmbedToken } from "@/lib/embeds/token";
import { FIELD_CAUTION, findShape, InputError, type Shape, type StoredOutline } from "@/lib/engine";
import { teamOutline } from "@/lib/fields/team-outlines";
import type { Service } from "@/lib/service/service";
import { outlinePlan } from "../../_ui/drawing/outline-plan";
import { cautionTexts } from "../_cautions/choose";
import { labelIn } from "../_labels/label-in";
import { wordsOf } from "../_words/choose";
import { type Naming, rangeText, shownInputs } from "./frame-inputs";
import type { FrameView } from "./frame-view";

interface Asked {
  /** Language that the page around asks for. */
  readonly language: string | undefined;
  readonly acceptLanguage: string | null;
  /** Origin of the page around; empty where it is not known or not one of the widget's. */
  readonly host: string;
  readonly preview: boolean;
  /** Values in the frame's address, by name. */
  readonly values: Readonly<Record<string, string>>;
  /** Own origins: the configured one and the one that was called. */
  readonly own: readonly string[];
}

/** What a frame shows of a version, with the token it computes with. */
export async function frameViewOf(
  service: Service,
  shown: ShownEmbed,
  asked: Asked,
): Promise<FrameView | null> {
  const { embed, version, definition } = shown;
  const shape = findShape(definition.shape ?? "");
  const stored =
    definition.outlineId === undefined
      ? undefined
      : teamOutline(service.db, embed.teamId, definition.outlineId);
  const facts = definitionInputs(definition);
  if (!facts || !(shape ?? stored)) return null;
  const cautions = shape?.cautions ?? [FIELD_CAUTION];
  const { language, locale } = speechOf(definition.language, asked.language, asked.acceptLanguage);
  const words = wordsOf(language);
  const naming: Naming = { service, teamId: embed.teamId, shape, language, words, locale };
  const { open, fixed, tolerances } = shownInputs(definition, facts, naming);
  const start = Object.fromEntries(
    [...open, ...(tolerances?.open ?? [])].map(({ name, value }) => [name, asked.values[name] ?? value]),
  );
  const drawing = shape && definition.show.drawing ? firstDrawing(definition, shape, start) : null;
  const binding = { embedId: embed.id, version, host: asked.host, preview: asked.preview };
  return {
    embed: embed.id,
    title: definition.title,
    intro: definition.intro ?? null,
    open,
    fixed,
    tolerances,
    requirement: definition.requirement ? rangeText(definition.requirement, naming) : null,
    show: definition.show,
    accent: definition.accent ?? null,
    density: definition.density,
    locale,
    words,
    owner: ownerText(service, embed.teamName),
    service: service.config.origin,
    cautions,
    cautionTexts: cautionTexts(language, cautions),
    coordinateLabel: labelIn(language, shape?.coordinates.find(({ role }) => role === "along")?.label ?? ""),
    preview: asked.preview,
    hosts: [...new Set([...asked.own, ...embed.origins])],
    token: await issueEmbedToken(service.config.secret, binding, service.now()),
    start,
    drawing,
    viewTitles: Object.fromEntries(
      (drawing?.drawing.views ?? []).map(({ title }) => [title, labelIn(language, title)]),
    ),
    outline: stored ? shownOutline(definition, stored) : null,
  };
}

/** Where a version does not say how narrow the bracket shall be: as the API has it. */
const USUAL_ACCURACY = 1e-4;

/** A sheet on which the names of the terminals can be read at 320 px. */
const PLAN_SHEET = { width: 300, tallest: 220, margin: 14 };

function shownOutline(
  { show, terminals, accuracy = USUAL_ACCURACY }: EmbedDefinition,
  { outline, terminals: own }: StoredOutline,
): NonNullable<FrameView["outline"]> {
  return { plan: show.drawing ? outlinePlan(outline, terminals ?? own, PLAN_SHEET) : null, accuracy };
}

function ownerText({ db }: Service, teamName: string): string {
  const organisation = readSetting(db, "organisation");
  const name =
    typeof organisation === "object" && organisation !== null && "name" in organisation
      ? String(organisation.name)
      : "";
  return name === "" ? teamName : `${teamName}, ${name}`;
}

function firstDrawing(
  definition: EmbedDefinition,
  shape: Shape,
  values: Readonly<Record<string, string>>,
): FrameView["drawing"] {
  for (const given of [values, {}]) {
    try {
      const reading = readGeometry(shape, widgetDimensions(definition, { values: given }));
      if (reading.ok) return frameDrawing(definition, reading.geometry);
    } catch (error) {
      if (!(error instanceof InputError)) throw error;
    }
  }
  return null;
}
