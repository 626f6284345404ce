/** Version of the computation; part of every frozen evaluation, raised whenever any output could change. */
export const ENGINE_VERSION = '0.2.0'
