import { ref } from 'vue'
import { DEFAULT_WALK, WALK_SETTINGS, WalkSettings, type WalkSettingKey } from '@shared/court/walk/settings'
import { forget, keep, keyOf, recall } from '@/composables/kept'

const KEY = keyOf('walk')

export const WALK_KEYS = Object.keys(WALK_SETTINGS) as WalkSettingKey[]

const kept = (): WalkSettings =>
  recall(KEY, (value) => {
    const parsed = WalkSettings.safeParse(value)
    return parsed.success ? { ...parsed.data, runners: {} } : null
  }) ?? DEFAULT_WALK

/** What the walk assumes, as this device keeps it. */
export function useWalkSettings() {
  const settings = ref<WalkSettings>(kept())

  /** Held to what the setting allows; something that is no number is left as it was. */
  function set(key: WalkSettingKey, value: number): void {
    if (!Number.isFinite(value)) return
    const { least, most } = WALK_SETTINGS[key]
    settings.value = { ...settings.value, [key]: Math.min(most, Math.max(least, value)) }
    keep(KEY, settings.value)
  }

  function reset(): void {
    settings.value = DEFAULT_WALK
    forget(KEY)
  }

  return { settings, set, reset }
}

/** How many settings differ from how they come. */
export const changedIn = (settings: WalkSettings): number =>
  WALK_KEYS.filter((key) => settings[key] !== WALK_SETTINGS[key].value).length
