/** A small bend: what threads and the service itself warm up on. */
export const WARMING_BODY = {
  outline: {
    outer: [
      [0, 0],
      [4, 0],
      [4, 1],
      [1, 1],
      [1, 4],
      [0, 4],
    ],
  },
  terminals: [
    {
      name: "a",
      segments: [
        [
          [4, 0],
          [4, 1],
        ],
      ],
    },
    {
      name: "b",
      segments: [
        [
          [1, 4],
          [0, 4],
        ],
      ],
    },
  ],
  medium: { sheetResistance: 1 },
};
