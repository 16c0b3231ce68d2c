import description from "../../../package.json" with { type: "json" };

export const version: string = description.version;
