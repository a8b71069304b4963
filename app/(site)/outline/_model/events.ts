/** Server-sent events from the text of a stream, chunk by chunk. */
export interface StreamEvent {
  readonly event: string;
  readonly data: string;
}

export class EventReader {
  private rest = "";

  /** Takes the next chunk and answers with the events that are whole by then. */
  read(chunk: string): readonly StreamEvent[] {
    const blocks = (this.rest + chunk).replaceAll("\r\n", "\n").split("\n\n");
    this.rest = blocks.pop() ?? "";
    return blocks.flatMap((block) => {
      let event = "message";
      const data: string[] = [];
      for (const line of block.split("\n")) {
        if (line.startsWith("event:")) event = line.slice(6).trim();
        else if (line.startsWith("data:")) data.push(line.slice(5).replace(/^ /, ""));
      }
      return data.length > 0 ? [{ event, data: data.join("\n") }] : [];
    });
  }
}
