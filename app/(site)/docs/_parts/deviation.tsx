/** A relative deviation with its exponent typeset. */
export function Deviation({ value }: { readonly value: number }) {
  if (value === 0) return "0";
  const [mantissa, exponent] = value.toExponential(1).split("e");
  return (
    <>
      {mantissa}&#8239;·&#8239;10<sup>{exponent.replace("-", "−").replace("+", "")}</sup>
    </>
  );
}
