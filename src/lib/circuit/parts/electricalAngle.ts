/** Degrees of electrical travel of a usual pot: 260 to 280 occur. From memory. */
export const electricalAngle = 270;
