/** One thing that happens in the demonstration, so many days before the seeding. */
export interface Scene {
  daysAgo: number
  play: () => Promise<void>
}

/** Scenes by day, the oldest first; those of one day in the order given. */
export const inOrder = (scenes: readonly Scene[]): Scene[] =>
  scenes
    .map((scene, at) => ({ scene, at }))
    .sort((a, b) => b.scene.daysAgo - a.scene.daysAgo || a.at - b.at)
    .map(({ scene }) => scene)
