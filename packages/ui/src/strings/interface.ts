/** Words of the shared interface parts; sentences about results live beside the things they describe. */

export const shellWords = {
  navigation: 'Main',
  breadcrumbs: 'Where you are',
  skip: 'Skip to the content',
  openMenu: 'Open the menu',
  waiting: 'waiting',
} as const
