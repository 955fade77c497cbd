/** Quantities carry their unit in the type inside the core; the outside world uses names (`temperatureC`). */
declare const unit: unique symbol;
type Quantity<U extends string> = number & { readonly [unit]: U };

export type Kelvin = Quantity<"K">;

/** Celsius to kelvin, the one place where the offset stands.
 *  @param celsius  C     @returns  K     @source  SI brochure, definition of the Celsius scale
 *  @example kelvin(25) // => 298.15 */
export const kelvin = (celsius: number): Kelvin => (celsius + 273.15) as Kelvin;

/** Kelvin to Celsius.
 *  @param T  K     @returns  C     @source  SI brochure
 *  @example toCelsius(kelvin(60)) // => 60 */
export const toCelsius = (T: Kelvin): number => T - 273.15;
