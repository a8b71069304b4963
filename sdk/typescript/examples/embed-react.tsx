/** The React example that the service shows under /embed-examples/react; its own source is printed beside it. */
import { useState } from "react";
import { createRoot } from "react-dom/client";
import { RhoformEmbed } from "@rhoform/client/react";

function Example({ embed, origin }: { readonly embed: string; readonly origin: string }) {
  const [length, setLength] = useState("250 mm");
  const [answer, setAnswer] = useState("no answer yet");
  return (
    <>
      <p>
        <label>
          Length, set by the page{" "}
          <select value={length} onChange={(event) => setLength(event.target.value)}>
            {["250 mm", "500 mm", "1 m"].map((text) => (
              <option key={text}>{text}</option>
            ))}
          </select>
        </label>{" "}
        Answer, told to the page: <output>{answer}</output>
      </p>
      <RhoformEmbed
        origin={origin}
        embed={embed}
        values={{ length }}
        onResult={(result) => setAnswer(result.resistance?.text ?? "")}
        onError={(error) => setAnswer(error.message)}
      />
    </>
  );
}

const root = document.getElementById("root");
if (root?.dataset.embed && root.dataset.origin) {
  createRoot(root).render(<Example embed={root.dataset.embed} origin={root.dataset.origin} />);
}
