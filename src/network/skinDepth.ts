const vacuumPermeability = 4e-7 * Math.PI;
/** S/m; annealed copper at 20 °C (IEC 60028), rounded as the texts do. */
export const copperConductivity = 5.8e7;

/** √(2/(ωμσ)) in metres for a frequency in Hz (> 0) and a conductivity in S/m (Pozar, Microwave Engineering, eq. 1.60). */
export const skinDepthM = (frequencyHz: number, conductivity: number): number => 1 / Math.sqrt(Math.PI * frequencyHz * vacuumPermeability * conductivity);

/** Ω per square of a thick conductor: 1/(σδ) (Pozar, eq. 1.125). */
export const surfaceResistanceOhm = (frequencyHz: number, conductivity: number): number => 1 / (conductivity * skinDepthM(frequencyHz, conductivity));
