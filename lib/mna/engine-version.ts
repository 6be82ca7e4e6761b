/** Printed with every result: which engine computed it. */
export const engineVersion = "0.2.0";
