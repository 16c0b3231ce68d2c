/** The rows of the comparison, alike for both cells but for what is given. */
export const traits = (own: { opAmps: string; inverts: string; bandwidth: string; swing: string }) => [
  { label: "Op amps", text: own.opAmps },
  { label: "Inverts", text: own.inverts },
  { label: "Bandwidth set by", text: own.bandwidth },
  { label: "Swing limited by", text: own.swing },
  { label: "Gain follows", text: "the bias current, in proportion" },
];

export const leavesOut = [
  "spread of the transconductance from part to part, 30 % either way",
  "finite output resistance and capacitance of the amplifier",
  "emitter resistance of the pair, which straightens the law at large bias currents",
  "input capacitance, and the input current's own noise",
];
