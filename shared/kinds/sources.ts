/** Where equations and typical values come from, as shown under "How is this computed?". Books are named by title, edition and
 *  example; standards are quoted from handbooks that cite them. What nobody published says so. */

export const PRACTICE = 'common practice, no source';
export const TYPICAL = 'usual range, from memory: the maker’s data prevail';
export const CHOICE = 'a choice of this run';
export const ENTERED = 'entered';
export const DEFINITION = 'definition';

export const ORIFICE = 'orifice equation: Fluid Power with Applications, 6th ed., ex. 8.4 and 8.5';
export const THROTTLING_HEAT = 'Fluid Power with Applications, 6th ed., ex. 11.2';
export const PUMP_FLOW = 'Fluid Power with Applications, 6th ed., ex. 5.8 and 5.9';
export const PUMP_LOSS =
  'three-coefficient pump loss model: form and size from memory; ex. 5.8 and 5.9 of Fluid Power with Applications, 6th ed.';
export const CASE_DRAIN = 'Fluid Power: Theory and Applications, 4th ed., ex. 9.5 (about 2 %); trade magazine (10 % is worn)';
export const COMPENSATOR = 'US Navy NAVEDTRA 14105 Fluid Power, p. 4-15; US Army TM 5-3805-291-23-1 (band 3 to 5 % of the setting)';
export const STROKE_TIME = 'pump catalogues, from memory; definitions as in SAE J745';
export const STOP = 'US Army TM 5-3820-256-24-1, para. 4-6.3.4 (2.5 cm³/rev per turn, 39 to 100 % of full stroke)';
export const INLET = 'SAE J745 as quoted in US Army TM 5-3820-256-24-2 (0.844 bar absolute); other limits 0.675 to 0.9 bar';
export const RELIEF =
  'Fluid Power with Applications, 6th ed., ex. 8.1; trade magazine on relief valves (pilot-operated: opens at about 90 %)';
export const RELIEF_SIZE =
  'aircraft hydraulics text: sized for full pump flow with the compensator failed; Fluid Power with Applications, 6th ed., ex. 8.2';
export const RELIEF_GAP = 'a pump maker’s page: relief 10 % above the compensator';
export const RESEAT = 'aircraft hydraulics text (below cracking, through friction); the amount, 80 to 95 %, from memory';
export const SYNCHRONOUS = 'ns = 120·f/poles; motor sizing guide (4 poles 60 Hz: 1750 to 1780 rpm at full load)';
export const MOTOR_CURVE = 'Kloss equation: Electrical Machines, ex. 4.16; voltage: Electric Machines, ex. 5.4 and 5.6';
export const MINIMA = 'least torques of IEC design N as quoted by an engineering handbook';
export const ROTOR_CURRENT = 'NEMA MG 1-12.35 and NEC table 430.250 as quoted in the EASA handbook (5.4 to 6.7 times)';
export const SERVICE_FACTOR = 'NEMA MG 1-1.42 and 14.37 as quoted by a handbook';
export const RELAY = 'trip classes of IEC 60947-4-1 and NEMA as quoted by relay makers; one-body heat equation';
export const CYLINDER = 'Fluid Power with Applications, 6th ed., ex. 6.1 and 6.4';
export const INTENSIFICATION = 'trade article: cap 3000 psi on a 2:1 cylinder gives 6000 psi on a blocked rod side';
export const CONTINUITY = 'Fluid Power Engineering (2009), eq. 2.51 to 2.57';
export const POWER = 'power = torque × speed: Engineering ToolBox; Fluid Power with Applications, 6th ed.';
export const NEWTON = 'Newton’s law';
export const SYMBOLS = 'ISO 1219-1';

/** Limits of a reading that has none of its own. */
export const AS_INPUTS = 'No better than the figures that go in.';
