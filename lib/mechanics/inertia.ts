/**
 * Mean yaw dynamic index I / (m a b) of the 73 passenger cars of the NHTSA Light Vehicle Inertial Parameter Database
 * (Heydinger et al., SAE 1999-01-1336), and the relative standard deviation of the rule over those cars. For light
 * trucks and vans the mean index of the same database is nearer 1.002.
 */
export const YAW_DYNAMIC_INDEX = 1.091;
export const YAW_INERTIA_RELATIVE_SD = 0.073;

/** Yaw inertia, kg m^2, of a car of mass m (kg) whose axles stand a and b (m) from the mass centre. */
export const estimatedYawInertia = (m: number, a: number, b: number): number => YAW_DYNAMIC_INDEX * m * a * b;
