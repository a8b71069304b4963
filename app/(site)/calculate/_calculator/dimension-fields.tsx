"use client";

import { QuantityInput } from "../../../_ui/quantity-input";
import { QuantitySymbol } from "../../../_ui/quantity-symbol";
import { Segmented } from "../../../_ui/segmented";
import { Select } from "../../../_ui/select";
import { textInUnit } from "../../../_ui/quantity/convert";
import { splitQuantity } from "../../../_ui/quantity/quantity-text";
import { FIRST_UNIT, findUnit, type UnitKind, unitsOf } from "../../../_ui/quantity/units";
import { sentence } from "../_model/complaints";
import { chosenMember, dimensionGroups } from "../_model/parameters";
import { noTolerance } from "../_model/tolerances";
import type { FormDimension } from "../_server/form-facts";
import { useForm } from "./form-context";
import { MemberMenu } from "./member-menu";
import { ToleranceButton, ToleranceRow } from "./tolerance-field";

/** Every dimension of the shape; where it can be given in several ways, the reader chooses which. */
export function DimensionFields() {
  const { entry, dimensions, parameters } = useForm();
  const byName = new Map(dimensions.map((dimension) => [dimension.name, dimension]));
  return (
    <fieldset className="grid gap-x-2 narrow:max-wide:grid-cols-2">
      <legend className="sr-only">Dimensions</legend>
      {dimensionGroups(entry).map((group) => {
        const dimension = byName.get(chosenMember(group, parameters));
        const members = group.flatMap((name) => byName.get(name) ?? []);
        return dimension ? <DimensionField key={group[0]} dimension={dimension} members={members} /> : null;
      })}
    </fieldset>
  );
}

interface DimensionFieldProps {
  readonly dimension: FormDimension;
  readonly members: readonly FormDimension[];
}

function DimensionField({ dimension, members }: DimensionFieldProps) {
  const form = useForm();
  const { parameters, change, errorAt, onFocus, values } = form;
  const { name, label, symbol, help, type, choices } = dimension;
  const text = parameters[name] ?? "";
  const fallback = dimension.default;

  if (type === "choice" && choices) {
    const value = text === "" ? String(fallback ?? choices[0].value) : text;
    const shared = { label: <LabelText label={label} symbol={symbol} />, value };
    const options = choices.map((choice) => ({ ...choice, label: sentence(choice.label) }));
    const short = choices.length <= 3 && choices.reduce((sum, choice) => sum + choice.label.length, 0) <= 36;
    return short ? (
      <Segmented
        {...shared}
        options={options}
        onChange={(next) => change({ [name]: next })}
        className="mb-3"
      />
    ) : (
      <Select
        {...shared}
        help={help}
        options={options}
        error={errorAt(name)}
        onChange={(event) => change({ [name]: event.target.value })}
      />
    );
  }

  const kind = kindOf(dimension);
  const swap = (next: FormDimension) =>
    change({
      [name]: undefined,
      ...noTolerance(name),
      [next.name]: memberText(next, values[next.name], parameters[name]),
    });
  const toleranced = type === "quantity" && text !== "";
  const field = (
    <QuantityInput
      name={name}
      label={label}
      symbol={symbol}
      help={help}
      helpOnDemand
      kind={kind}
      bareUnit={bareUnitOf(dimension)}
      foil={dimension.foil}
      value={text}
      placeholder={fallback === null ? undefined : String(fallback)}
      error={errorAt(name)}
      onChange={(next) => change({ [name]: next === "" && fallback !== null ? undefined : next })}
      onFocusChange={(focused) => onFocus(focused ? dimension.line : undefined)}
      beside={
        <>
          {toleranced ? <ToleranceButton form={form} name={name} label={label} /> : null}
          {members.length > 1 ? <MemberMenu members={members} chosen={dimension} onChoose={swap} /> : null}
        </>
      }
    />
  );
  return (
    <div>
      {field}
      {toleranced ? <ToleranceRow form={form} name={name} label={label} /> : null}
    </div>
  );
}

function LabelText({ label, symbol }: { readonly label: string; readonly symbol: string }) {
  return (
    <>
      {label} {symbol === "" ? null : <QuantitySymbol text={symbol} />}
    </>
  );
}

const KINDS: Readonly<Record<string, UnitKind>> = { m: "length", "m^2": "area", deg: "angle", "1": "number" };

/** What a dimension measures, by the unit of its bare numbers. */
export function kindOf(dimension: FormDimension): UnitKind {
  return KINDS[dimension.unit ?? "1"] ?? "number";
}

function bareUnitOf(dimension: FormDimension): string | undefined {
  return dimension.unit === "1" || dimension.unit === null ? undefined : dimension.unit;
}

/** A derived value as the text of its field, in the unit that the field before had. */
export function memberText(
  dimension: FormDimension,
  value: number | undefined,
  before: string | undefined,
  digits?: number,
): string {
  if (value === undefined) return "";
  const units = unitsOf(kindOf(dimension), dimension.foil);
  const unit = splitQuantity(before ?? "", units).unit ?? findUnit(FIRST_UNIT[kindOf(dimension)], units);
  return unit ? `${textInUnit(value, unit, digits)} ${unit.id}` : String(value);
}
