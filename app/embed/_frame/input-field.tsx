"use client";

import { Field } from "../../_ui/field";
import { QuantitySymbol } from "../../_ui/quantity-symbol";
import { UnitEntry } from "../../_ui/quantity/unit-entry";
import { Select } from "../../_ui/select";
import { filled, type Words } from "../_words/words";
import type { OpenInput } from "./frame-view";

interface InputFieldProps {
  readonly input: OpenInput;
  readonly value: string;
  /** The API's complaint, in English. */
  readonly error: string | undefined;
  readonly words: Words;
  readonly locale: string;
  readonly onChange: (text: string) => void;
  readonly onFocusChange: (focused: boolean) => void;
}

/** One open input: a number with its unit, or one of a list. Its range stands below it. */
export function InputField(props: InputFieldProps) {
  const { input, value, error, words, locale, onChange, onFocusChange } = props;
  const { label, symbol, range, choices } = input;
  const title = (
    <>
      {label} {symbol ? <QuantitySymbol text={symbol} /> : null}
    </>
  );
  const help = [input.about, input.help, range].filter(Boolean).join(" ") || undefined;
  const message = error === undefined ? undefined : refusalText(error, words, locale, range);
  if (choices) {
    // What the page around has set may be off the list; it stays in sight, with its complaint.
    const known = choices.some((choice) => choice.value === value);
    return (
      <Select
        label={title}
        help={help}
        error={message}
        value={value}
        options={known ? choices : [{ value, label: value }, ...choices]}
        onChange={(event) => onChange(event.target.value)}
        onFocus={() => onFocusChange(true)}
        onBlur={() => onFocusChange(false)}
      />
    );
  }
  return (
    <Field label={title} help={help} error={message}>
      {(control) => (
        <UnitEntry
          control={control}
          label={label}
          kind={input.kind}
          foil={input.foil}
          value={value}
          onChange={onChange}
          onFocusChange={onFocusChange}
          name={input.name}
          locale={locale}
          unitName={filled(words.unitOf, label)}
        />
      )}
    </Field>
  );
}

/** In the reader's language first; the particulars are the API's own, in English. */
export function refusalText(error: string, words: Words, locale: string, range: string | null): string {
  if (locale.startsWith("en")) return sentence(error);
  return range === null ? `${words.refused} (${error})` : `${words.refused} ${sentence(range)}`;
}

function sentence(text: string): string {
  return text === "" ? "" : text[0].toUpperCase() + text.slice(1);
}
