/** Cautions that several shapes carry word for word: where a number touches safety, it says what it is not. */

/** For shapes that are used as insulation or see a leakage current. */
export const INSULATION_CAUTION =
  "This is a DC resistance under the stated assumptions and no proof of compliance: insulation, touch voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.";

/** For shapes that carry a working current. */
export const AMPACITY_CAUTION =
  "This is a DC resistance under the stated assumptions and no proof of compliance: ampacity, temperature rise and protection are for the local code and a licensed or otherwise competent engineer.";

/** For single electrodes in the ground or in water. */
export const ELECTRODE_CAUTION =
  "This is a DC resistance under the stated assumptions and no proof of compliance: touch and step voltage, fault duration and protection are for the local code and a licensed or otherwise competent engineer.";
