/** Named in every forecast: the same version gives the same numbers from the same inputs. Raise it when a result changes. */
export const engineVersion = '2';
