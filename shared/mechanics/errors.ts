/** Why a definition cannot be solved. Stable; travels to the API as `mechanics_invalid` with the field. */
export type MechanicsErrorCode =
  | 'unreachable_endpoint'
  | 'unbalanceable_posture'
  | 'unloaded_contact'
  | 'unsupported_combination'
  | 'wrong_frame_count'
  | 'wrong_curve_length'
  | 'bad_number'

/** A definition that mechanics refuses: `field` is the dotted path in the definition, the message says what to do. */
export class MechanicsError extends Error {
  override readonly name = 'MechanicsError'
  constructor(
    readonly code: MechanicsErrorCode,
    readonly field: string,
    message: string,
  ) {
    super(message)
  }
}
