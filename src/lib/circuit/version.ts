/** Version of the calculation library, stored with every saved figure. Raised when a figure changes. */
export const libraryVersion = "0.1.0";
