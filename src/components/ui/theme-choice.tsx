import { Chip, ChoiceGroup } from '@/components/ui/choice-group'
import { chooseTheme, THEME_CHOICES, useThemeChoice, type ThemeChoice as Choice } from '@/lib/theme'

const LABELS: Record<Choice, string> = { system: 'As this device', light: 'Light', dark: 'Dark' }

/** Kept on this device only. */
export function ThemeChoice() {
  const chosen = useThemeChoice()
  return (
    <ChoiceGroup legend="Appearance" className="[&_legend]:font-semibold">
      {THEME_CHOICES.map((choice) => (
        <Chip
          key={choice}
          type="radio"
          name="theme"
          label={LABELS[choice]}
          checked={chosen === choice}
          onChange={() => chooseTheme(choice)}
        />
      ))}
    </ChoiceGroup>
  )
}
