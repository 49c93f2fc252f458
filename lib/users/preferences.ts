import type { Transaction } from "sequelize";
import { z } from "zod";
import { FIRST_PREFERENCES, MEASURES, type Preferences, UNIT_SYSTEMS } from "@/lib/vocabulary/measures";
import { User } from "@/models/user";

const StoredPreferences = z.object({
  measure: z.enum(MEASURES).catch(FIRST_PREFERENCES.measure),
  units: z.enum(UNIT_SYSTEMS).catch(FIRST_PREFERENCES.units),
});

/** The preferences column of a person: what it doesn't say, or says in words of another version, is as at first. */
export function parsePreferences(text: string): Preferences {
  return StoredPreferences.parse(JSON.parse(text));
}

/** Writes what was chosen over what stood there. */
export async function setPreferences(
  userId: number,
  change: Partial<Preferences>,
  tx: Transaction,
): Promise<Preferences> {
  const user = await User.findByPk(userId, { transaction: tx, rejectOnEmpty: true });
  const preferences = { ...parsePreferences(user.preferences), ...change };
  await user.update({ preferences: JSON.stringify(preferences) }, { transaction: tx });
  return preferences;
}
