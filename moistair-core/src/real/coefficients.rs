//! Constants of the elementary functions. Printed by `tools/elementary.py coefficients`; do not edit.

#![allow(clippy::approx_constant, reason = "ln 2 in two parts")]

/// For `f64`.
#[rustfmt::skip]
pub mod double {
    /// ln 2, so few digits that a product with an exponent is exact.
    pub const LN_2_HIGH: f64 = 0.6931471805598903;
    /// The rest of ln 2.
    pub const LN_2_LOW: f64 = 5.497923018708371e-14;
    /// Largest argument whose exponential is finite.
    pub const EXP_LARGEST: f64 = 709.782712893384;
    /// Smallest argument whose exponential is a normal number.
    pub const EXP_SMALLEST: f64 = -708.3964185322641;
    /// What half a π is above its rounded value.
    pub const HALF_PI_LOW: f64 = 6.123233995736766e-17;
    /// What quarter a π is above its rounded value.
    pub const QUARTER_PI_LOW: f64 = 3.061616997868383e-17;
    /// (eʳ − 1 − r)/r², even powers; error of the fit 4.1e-18.
    pub const EXP_EVEN: [f64; 5] = [0.5000000000000012, 0.04166666666651975, 0.0013888888945921057, 2.4801491030993337e-05, 2.763090755114223e-07];
    /// (eʳ − 1 − r)/r², odd powers; error of the fit 4.1e-18.
    pub const EXP_ODD: [f64; 5] = [0.16666666666666471, 0.008333333333458665, 0.00019841269581196487, 2.755752164644174e-06, 2.5020074850572813e-08];
    /// (2 artanh(s)/s − 2)/z by z = s², even powers; error of the fit 1.3e-18.
    pub const LN_EVEN: [f64; 4] = [0.6666666666666736, 0.28571428744024446, 0.18183570902528876, 0.14797351148766122];
    /// (2 artanh(s)/s − 2)/z by z = s², odd powers; error of the fit 1.3e-18.
    pub const LN_ODD: [f64; 3] = [0.39999999999405617, 0.2222219842981173, 0.15313898428426098];
    /// (atan(t)/t − 1)/z by z = t², even powers; error of the fit 4.4e-18.
    pub const ATAN_EVEN: [f64; 6] = [-0.33333333333332954, -0.1428571427595821, -0.09090895876504297, -0.06663761134535458, -0.051207143392301445, -0.027383355414861636];
    /// (atan(t)/t − 1)/z by z = t², odd powers; error of the fit 4.4e-18.
    pub const ATAN_ODD: [f64; 6] = [0.199999999998974, 0.11111110643283645, 0.07692068653857718, 0.05857988006782397, 0.04183099742305275, 0.0100826203482549];
}

/// For `f32`.
#[rustfmt::skip]
pub mod single {
    /// ln 2, so few digits that a product with an exponent is exact.
    pub const LN_2_HIGH: f32 = 0.693145751953125;
    /// The rest of ln 2.
    pub const LN_2_LOW: f32 = 1.428606765330187e-06;
    /// Largest argument whose exponential is finite.
    pub const EXP_LARGEST: f32 = 88.72283172607422;
    /// Smallest argument whose exponential is a normal number.
    pub const EXP_SMALLEST: f32 = -87.33654022216797;
    /// What half a π is above its rounded value.
    pub const HALF_PI_LOW: f32 = -4.371138828673793e-08;
    /// What quarter a π is above its rounded value.
    pub const QUARTER_PI_LOW: f32 = -2.1855694143368964e-08;
    /// (eʳ − 1 − r)/r², even powers; error of the fit 3.7e-09.
    pub const EXP_EVEN: [f64; 3] = [0.49999988079071045, 0.04166964814066887, 0.0013745325850322843];
    /// (eʳ − 1 − r)/r², odd powers; error of the fit 3.7e-09.
    pub const EXP_ODD: [f64; 2] = [0.166665181517601, 0.008368946611881256];
    /// (2 artanh(s)/s − 2)/z by z = s², even powers; error of the fit 8.1e-10.
    pub const LN_EVEN: [f64; 2] = [0.6666677594184875, 0.29870593547821045];
    /// (2 artanh(s)/s − 2)/z by z = s², odd powers; error of the fit 8.1e-10.
    pub const LN_ODD: [f64; 1] = [0.399775892496109];
    /// (atan(t)/t − 1)/z by z = t², even powers; error of the fit 5.9e-09.
    pub const ATAN_EVEN: [f64; 3] = [-0.33333227038383484, -0.14172162115573883, -0.05112028494477272];
    /// (atan(t)/t − 1)/z by z = t², odd powers; error of the fit 5.9e-09.
    pub const ATAN_ODD: [f64; 2] = [0.19993974268436432, 0.10147061198949814];
}
