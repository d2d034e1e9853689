/*
 * Water and steam by IAPWS R7-97 (2012), the IAPWS Industrial Formulation 1997, called IF97: the pressure at which steam is
 * saturated (region 4), and the enthalpy of the water (region 1) and of the steam (region 2) there. The coefficients are
 * those of its Tables 2, 10, 11 and 34.
 */

/** kJ/kgK, IF97 equation 1. */
const gasConstant = 0.461526;

/** Table 34. */
const region4 = [
  1167.0521452767, -724213.16703206, -17.073846940092, 12020.82470247, -3232555.0322333, 14.91510861353,
  -4823.2657361591, 405113.40542057, -0.23855557567849, 650.17534844798,
] as const;

/** Table 2: power of (7.1 - pressure / 16.53 MPa), power of (1386 K / temperature - 1.222), coefficient. */
const region1: readonly (readonly [number, number, number])[] = [
  [0, -2, 0.14632971213167],
  [0, -1, -0.84548187169114],
  [0, 0, -3.756360367204],
  [0, 1, 3.3855169168385],
  [0, 2, -0.95791963387872],
  [0, 3, 0.15772038513228],
  [0, 4, -0.016616417199501],
  [0, 5, 8.1214629983568e-4],
  [1, -9, 2.8319080123804e-4],
  [1, -7, -6.0706301565874e-4],
  [1, -1, -0.018990068218419],
  [1, 0, -0.032529748770505],
  [1, 1, -0.021841717175414],
  [1, 3, -5.283835796993e-5],
  [2, -3, -4.7184321073267e-4],
  [2, 0, -3.0001780793026e-4],
  [2, 1, 4.7661393906987e-5],
  [2, 3, -4.4141845330846e-6],
  [2, 17, -7.2694996297594e-16],
  [3, -4, -3.1679644845054e-5],
  [3, 0, -2.8270797985312e-6],
  [3, 6, -8.5205128120103e-10],
  [4, -5, -2.2425281908e-6],
  [4, -2, -6.5171222895601e-7],
  [4, 10, -1.4341729937924e-13],
  [5, -8, -4.0516996860117e-7],
  [8, -11, -1.2734301741641e-9],
  [8, -6, -1.7424871230634e-10],
  [21, -29, -6.8762131295531e-19],
  [23, -31, 1.4478307828521e-20],
  [29, -38, 2.6335781662795e-23],
  [30, -39, -1.1947622640071e-23],
  [31, -40, 1.8228094581404e-24],
  [32, -41, -9.3537087292458e-26],
];

/** Table 10, the ideal gas: power of (540 K / temperature), coefficient. */
const region2Ideal: readonly (readonly [number, number])[] = [
  [0, -9.6927686500217],
  [1, 10.086655968018],
  [-5, -0.005608791128302],
  [-4, 0.071452738081455],
  [-3, -0.40710498223928],
  [-2, 1.4240819171444],
  [-1, -4.383951131945],
  [2, -0.28408632460772],
  [3, 0.021268463753307],
];

/** Table 11, the rest: power of the pressure in MPa, power of (540 K / temperature - 0.5), coefficient. */
const region2Residual: readonly (readonly [number, number, number])[] = [
  [1, 0, -0.0017731742473213],
  [1, 1, -0.017834862292358],
  [1, 2, -0.045996013696365],
  [1, 3, -0.057581259083432],
  [1, 6, -0.05032527872793],
  [2, 1, -3.3032641670203e-5],
  [2, 2, -1.8948987516315e-4],
  [2, 4, -0.0039392777243355],
  [2, 7, -0.043797295650573],
  [2, 36, -2.6674547914087e-5],
  [3, 0, 2.0481737692309e-8],
  [3, 1, 4.3870667284435e-7],
  [3, 3, -3.227767723857e-5],
  [3, 6, -0.0015033924542148],
  [3, 35, -0.040668253562649],
  [4, 1, -7.8847309559367e-10],
  [4, 2, 1.2790717852285e-8],
  [4, 3, 4.8225372718507e-7],
  [5, 7, 2.2922076337661e-6],
  [6, 3, -1.6714766451061e-11],
  [6, 16, -0.0021171472321355],
  [6, 35, -23.895741934104],
  [7, 0, -5.905956432427e-18],
  [7, 11, -1.2621808899101e-6],
  [7, 25, -0.038946842435739],
  [8, 8, 1.1256211360459e-11],
  [8, 36, -8.2311340897998],
  [9, 13, 1.9809712802088e-8],
  [10, 4, 1.0406965210174e-19],
  [10, 10, -1.0234747095929e-13],
  [10, 14, -1.0018179379511e-9],
  [16, 29, -8.0882908646985e-11],
  [16, 50, 0.10693031879409],
  [18, 57, -0.33662250574171],
  [20, 20, 8.9185845355421e-25],
  [20, 35, 3.0629316876232e-13],
  [20, 48, -4.2002467698208e-6],
  [21, 21, -5.9056029685639e-26],
  [22, 53, 3.7826947613457e-6],
  [23, 39, -1.2768608934681e-15],
  [24, 26, 7.3087610595061e-29],
  [24, 40, 5.5414715350778e-17],
  [24, 58, -9.436970724121e-7],
];

/** Pressure in MPa absolute at which steam of this temperature in K is saturated: IF97 equation 30, 273.15 K to 647.096 K. */
export function saturationPressureMPa(temperatureK: number): number {
  const [n1, n2, n3, n4, n5, n6, n7, n8, n9, n10] = region4;
  const theta = temperatureK + n9 / (temperatureK - n10);
  const a = theta * theta + n1 * theta + n2;
  const b = n3 * theta * theta + n4 * theta + n5;
  const c = n6 * theta * theta + n7 * theta + n8;
  return ((2 * c) / (-b + Math.sqrt(b * b - 4 * a * c))) ** 4;
}

/** Enthalpy of liquid water in kJ/kg: IF97 equation 7 and Table 3. */
export function waterEnthalpy(temperatureK: number, pressureMPa: number): number {
  const inverse = 1386 / temperatureK - 1.222;
  const slope = region1.reduce(
    (sum, [i, j, n]) => sum + n * (7.1 - pressureMPa / 16.53) ** i * j * inverse ** (j - 1),
    0,
  );
  return gasConstant * 1386 * slope;
}

/** Enthalpy of steam in kJ/kg: IF97 equations 15 to 17 and Table 12. */
export function steamEnthalpy(temperatureK: number, pressureMPa: number): number {
  const inverse = 540 / temperatureK;
  const ideal = region2Ideal.reduce((sum, [j, n]) => sum + n * j * inverse ** (j - 1), 0);
  const residual = region2Residual.reduce(
    (sum, [i, j, n]) => sum + n * pressureMPa ** i * j * (inverse - 0.5) ** (j - 1),
    0,
  );
  return gasConstant * 540 * (ideal + residual);
}
