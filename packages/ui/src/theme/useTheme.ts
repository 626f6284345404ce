import { computed, ref, type ComputedRef, type Ref } from 'vue'
import { useTheme as useVuetifyTheme } from 'vuetify'

/** What the person chose: the system's own setting, or one look always. */
export type ThemeChoice = 'system' | 'light' | 'dark'

const storageKey = 'evenrule.theme'
const choices: readonly ThemeChoice[] = ['system', 'light', 'dark']

/** The stored choice; "system" where none is stored or storage is closed to us. */
export function storedThemeChoice(): ThemeChoice {
  try {
    const stored = localStorage.getItem(storageKey)
    return choices.find((choice) => choice === stored) ?? 'system'
  } catch {
    return 'system'
  }
}

// One choice per page: every caller of useTheme shows the same state.
const choice = ref<ThemeChoice>(storedThemeChoice())

export interface UseThemeReturn {
  choice: Readonly<Ref<ThemeChoice>>
  isDark: ComputedRef<boolean>
  choices: readonly ThemeChoice[]
  choose(next: ThemeChoice): void
}

/** Light, dark or as the system says; remembered in this browser. Call inside a component's setup. */
export function useTheme(): UseThemeReturn {
  const theme = useVuetifyTheme()
  return {
    choice,
    choices,
    isDark: computed(() => theme.current.value.dark),
    choose(next) {
      choice.value = next
      void theme.change(next)
      try {
        if (next === 'system') localStorage.removeItem(storageKey)
        else localStorage.setItem(storageKey, next)
      } catch {
        // Without storage the choice holds until the page is closed.
      }
    },
  }
}
