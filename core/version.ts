/** Version of the core: raised whenever a number it gives could change. Stored with every evaluation. */
export const CORE_VERSION = '0.1.0'
