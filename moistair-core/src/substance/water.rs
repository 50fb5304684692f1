//! The residual Helmholtz energy of water: IAPWS R6-95(2018), the terms of Table 2 that matter for vapor and liquid.

use super::Term;

/// Specific gas constant, J/(kg K): R6-95 Eq. (3).
pub const GAS_CONSTANT: f64 = 461.51805;
/// Critical temperature, K, reduces the temperature: R6-95 Eq. (1).
pub const CRITICAL_TEMPERATURE: f64 = 647.096;
/// Critical density, kg/m³, reduces the density: R6-95 Eq. (2).
pub const CRITICAL_DENSITY: f64 = 322.0;
/// Molar mass, kg/mol: IAPWS G5-01, as used in G8-10.
pub const MOLAR_MASS: f64 = 0.018015268;

/// Terms 1 to 51 of R6-95 Table 2. Terms 52 to 56 shape the critical region (`critical_region.rs`, which the Helmholtz formulation takes
/// in): their factors exp(−20(δ−1)²) and exp(−28(δ−1)² − 700(τ−1)²) leave less than 1e-16 of the residual of the liquid and its
/// derivatives at −45 to 205 °C, and less than 1e-12 of pressure, energy and heat capacity of the vapor up to saturation at 160 °C.
pub const TERMS: [Term; 51] = [
    Term::new(0, 1, -0.5, 0.012533547935523),
    Term::new(0, 1, 0.875, 7.8957634722828),
    Term::new(0, 1, 1.0, -8.7803203303561),
    Term::new(0, 2, 0.5, 0.31802509345418),
    Term::new(0, 2, 0.75, -0.26145533859358),
    Term::new(0, 3, 0.375, -0.0078199751687981),
    Term::new(0, 4, 1.0, 0.0088089493102134),
    Term::new(1, 1, 4.0, -0.66856572307965),
    Term::new(1, 1, 6.0, 0.20433810950965),
    Term::new(1, 1, 12.0, -6.6212605039687e-05),
    Term::new(1, 2, 1.0, -0.19232721156002),
    Term::new(1, 2, 5.0, -0.25709043003438),
    Term::new(1, 3, 4.0, 0.16074868486251),
    Term::new(1, 4, 2.0, -0.040092828925807),
    Term::new(1, 4, 13.0, 3.9343422603254e-07),
    Term::new(1, 5, 9.0, -7.5941377088144e-06),
    Term::new(1, 7, 3.0, 0.00056250979351888),
    Term::new(1, 9, 4.0, -1.5608652257135e-05),
    Term::new(1, 10, 11.0, 1.1537996422951e-09),
    Term::new(1, 11, 4.0, 3.6582165144204e-07),
    Term::new(1, 13, 13.0, -1.3251180074668e-12),
    Term::new(1, 15, 1.0, -6.2639586912454e-10),
    Term::new(2, 1, 7.0, -0.10793600908932),
    Term::new(2, 2, 1.0, 0.017611491008752),
    Term::new(2, 2, 9.0, 0.22132295167546),
    Term::new(2, 2, 10.0, -0.40247669763528),
    Term::new(2, 3, 10.0, 0.58083399985759),
    Term::new(2, 4, 3.0, 0.0049969146990806),
    Term::new(2, 4, 7.0, -0.031358700712549),
    Term::new(2, 4, 10.0, -0.74315929710341),
    Term::new(2, 5, 10.0, 0.4780732991548),
    Term::new(2, 6, 6.0, 0.020527940895948),
    Term::new(2, 6, 10.0, -0.13636435110343),
    Term::new(2, 7, 10.0, 0.014180634400617),
    Term::new(2, 9, 1.0, 0.0083326504880713),
    Term::new(2, 9, 2.0, -0.029052336009585),
    Term::new(2, 9, 3.0, 0.038615085574206),
    Term::new(2, 9, 4.0, -0.020393486513704),
    Term::new(2, 9, 8.0, -0.0016554050063734),
    Term::new(2, 10, 6.0, 0.0019955571979541),
    Term::new(2, 10, 9.0, 0.00015870308324157),
    Term::new(2, 12, 8.0, -1.638856834253e-05),
    Term::new(3, 3, 16.0, 0.043613615723811),
    Term::new(3, 4, 22.0, 0.034994005463765),
    Term::new(3, 4, 23.0, -0.076788197844621),
    Term::new(3, 5, 23.0, 0.022446277332006),
    Term::new(4, 14, 10.0, -6.2689710414685e-05),
    Term::new(6, 3, 50.0, -5.5711118565645e-10),
    Term::new(6, 6, 44.0, -0.19905718354408),
    Term::new(6, 6, 46.0, 0.31777497330738),
    Term::new(6, 6, 50.0, -0.11841182425981),
];
