/**
 * Mean of the yaw dynamic index I / (m a b) over the 73 passenger cars of the NHTSA Light Vehicle Inertial Parameter
 * Database (Heydinger et al., SAE 1999-01-1336). Vans and lorries lie nearer to 1.002.
 */
export const YAW_DYNAMIC_INDEX = 1.091;

/** Relative standard deviation of the rule over the same cars. */
export const YAW_INERTIA_RELATIVE_SD = 0.073;

/** Yaw inertia, kg m^2, of a vehicle of mass m, kg, whose mass centre lies a behind the front and b before the rear axle, m. */
export const estimatedYawInertia = (m: number, a: number, b: number): number => YAW_DYNAMIC_INDEX * m * a * b;
