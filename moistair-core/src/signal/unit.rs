//! What a channel carries and the unit that it carries it in.

use super::{Reason, coded::coded_enum};

coded_enum! {
    /// What a channel carries. The value that leaves a check is in the unit of the core, named with each.
    Kind {
        /// A temperature, °C.
        Temperature = 1, "temperature";
        /// A relative humidity, fraction.
        RelativeHumidity = 2, "relative humidity";
        /// An absolute pressure, Pa.
        Pressure = 3, "pressure";
        /// A difference of pressures, Pa.
        PressureDifference = 4, "pressure difference";
        /// A volume flow, m³/s.
        VolumeFlow = 5, "volume flow";
        /// A mass flow, kg/s.
        MassFlow = 6, "mass flow";
        /// A command, a position, a share: fraction.
        Fraction = 7, "fraction";
        /// A humidity ratio, kg/kg.
        HumidityRatio = 8, "humidity ratio";
        /// A heat flow or an electric power, W.
        Power = 9, "power";
        /// A time or a duration, s.
        Time = 10, "time";
        /// An amount of heat or of electric energy, J.
        Energy = 11, "energy";
        /// An enthalpy per mass of dry air, J/kg.
        SpecificEnthalpy = 12, "specific enthalpy";
    }
}

coded_enum! {
    /// The unit of a raw signal, or of a value that is shown.
    Unit {
        /// °C
        Celsius = 1, "°C";
        /// °F
        Fahrenheit = 2, "°F";
        /// K
        Kelvin = 3, "K";
        /// 1
        Fraction = 4, "1";
        /// %
        Percent = 5, "%";
        /// Pa
        Pascal = 6, "Pa";
        /// hPa, the same as mbar
        Hectopascal = 7, "hPa";
        /// kPa
        Kilopascal = 8, "kPa";
        /// bar
        Bar = 9, "bar";
        /// lbf/in²
        PoundPerSquareInch = 10, "psi";
        /// Inch of mercury at 32 °F: 3386.389 Pa
        InchOfMercury = 11, "inHg";
        /// m³/s
        CubicMeterPerSecond = 12, "m³/s";
        /// m³/h
        CubicMeterPerHour = 13, "m³/h";
        /// L/s
        LiterPerSecond = 14, "L/s";
        /// ft³/min
        CubicFootPerMinute = 15, "ft³/min";
        /// kg/s
        KilogramPerSecond = 16, "kg/s";
        /// kg/h
        KilogramPerHour = 17, "kg/h";
        /// lb/h
        PoundPerHour = 18, "lb/h";
        /// kg/kg
        KilogramPerKilogram = 19, "kg/kg";
        /// g/kg
        GramPerKilogram = 20, "g/kg";
        /// W
        Watt = 21, "W";
        /// kW
        Kilowatt = 22, "kW";
        /// s
        Second = 23, "s";
        /// min
        Minute = 24, "min";
        /// h
        Hour = 25, "h";
        /// J
        Joule = 26, "J";
        /// kWh
        KilowattHour = 27, "kWh";
        /// J/kg
        JoulePerKilogram = 28, "J/kg";
        /// kJ/kg
        KilojoulePerKilogram = 29, "kJ/kg";
    }
}

impl Unit {
    /// Whether a quantity of this kind can be given in this unit.
    #[must_use]
    pub const fn measures(self, kind: Kind) -> bool {
        use Unit::*;
        match kind {
            Kind::Temperature => matches!(self, Celsius | Fahrenheit | Kelvin),
            Kind::RelativeHumidity | Kind::Fraction => matches!(self, Fraction | Percent),
            Kind::Pressure | Kind::PressureDifference => {
                matches!(self, Pascal | Hectopascal | Kilopascal | Bar | PoundPerSquareInch | InchOfMercury)
            }
            Kind::VolumeFlow => {
                matches!(self, CubicMeterPerSecond | CubicMeterPerHour | LiterPerSecond | CubicFootPerMinute)
            }
            Kind::MassFlow => matches!(self, KilogramPerSecond | KilogramPerHour | PoundPerHour),
            Kind::HumidityRatio => matches!(self, KilogramPerKilogram | GramPerKilogram),
            Kind::Power => matches!(self, Watt | Kilowatt),
            Kind::Time => matches!(self, Second | Minute | Hour),
            Kind::Energy => matches!(self, Joule | KilowattHour),
            Kind::SpecificEnthalpy => matches!(self, JoulePerKilogram | KilojoulePerKilogram),
        }
    }

    /// A raw reading in the unit of the core: °C, fraction, Pa, m³/s, kg/s, kg/kg, W, s, J, J/kg.
    ///
    /// A reading that is in that unit already comes back bit for bit, except that −0 becomes 0; the decimal multiples
    /// are rounded once.
    ///
    /// ```
    /// use moistair_core::signal::Unit;
    /// assert_eq!(Unit::Percent.to_core(45.0), 0.45);
    /// assert_eq!(Unit::Fahrenheit.to_core(212.0), 100.0);
    /// assert!(Unit::Kelvin.to_core(f64::NAN).is_nan());
    /// ```
    #[must_use]
    pub const fn to_core(self, raw: f64) -> f64 {
        let (zero, factor, divisor) = self.conversion();
        (raw - zero) * factor / divisor + 0.0
    }

    /// A value in the unit of the core, in this unit: for display, logs and controllers.
    ///
    /// A value that is in this unit already comes back bit for bit, except that −0 becomes 0.
    ///
    /// ```
    /// use moistair_core::signal::Unit;
    /// assert_eq!(Unit::KilowattHour.from_core(9e6), 2.5);
    /// assert_eq!(Unit::Fahrenheit.from_core(100.0), 212.0);
    /// assert!(Unit::Kelvin.from_core(f64::NAN).is_nan());
    /// ```
    #[must_use]
    pub const fn from_core(self, value: f64) -> f64 {
        let (zero, factor, divisor) = self.conversion();
        value * divisor / factor + zero + 0.0
    }

    /// `(zero, factor, divisor)` of `(raw − zero) · factor / divisor`; all exact by definition but the inch of mercury.
    const fn conversion(self) -> (f64, f64, f64) {
        match self {
            Unit::Celsius
            | Unit::Fraction
            | Unit::Pascal
            | Unit::CubicMeterPerSecond
            | Unit::KilogramPerSecond
            | Unit::KilogramPerKilogram
            | Unit::Watt
            | Unit::Second
            | Unit::Joule
            | Unit::JoulePerKilogram => (0.0, 1.0, 1.0),
            Unit::Fahrenheit => (32.0, 5.0, 9.0),
            Unit::Kelvin => (273.15, 1.0, 1.0),
            Unit::Percent => (0.0, 1.0, 100.0),
            Unit::Hectopascal => (0.0, 100.0, 1.0),
            Unit::Kilopascal | Unit::Kilowatt | Unit::KilojoulePerKilogram => (0.0, 1000.0, 1.0),
            Unit::Minute => (0.0, 60.0, 1.0),
            Unit::Hour => (0.0, 3600.0, 1.0),
            Unit::KilowattHour => (0.0, 3.6e6, 1.0),
            Unit::Bar => (0.0, 1e5, 1.0),
            // One pound-force on the square of 0.0254 m.
            Unit::PoundPerSquareInch => (0.0, 4.4482216152605, 0.00064516),
            Unit::InchOfMercury => (0.0, 3386.389, 1.0),
            Unit::CubicMeterPerHour | Unit::KilogramPerHour => (0.0, 1.0, 3600.0),
            Unit::LiterPerSecond | Unit::GramPerKilogram => (0.0, 1.0, 1000.0),
            // The cube of 0.3048 m.
            Unit::CubicFootPerMinute => (0.0, 0.028316846592, 60.0),
            Unit::PoundPerHour => (0.0, 0.45359237, 3600.0),
        }
    }

    /// The reason that names this unit as the likely one.
    pub(super) const fn looks_like(self) -> Reason {
        match self {
            Unit::Celsius => Reason::LooksLikeCelsius,
            Unit::Fahrenheit => Reason::LooksLikeFahrenheit,
            Unit::Kelvin => Reason::LooksLikeKelvin,
            Unit::Fraction => Reason::LooksLikeFraction,
            Unit::Percent => Reason::LooksLikePercent,
            Unit::Pascal => Reason::LooksLikePascal,
            Unit::Hectopascal => Reason::LooksLikeHectopascal,
            Unit::Kilopascal => Reason::LooksLikeKilopascal,
            Unit::Bar => Reason::LooksLikeBar,
            Unit::PoundPerSquareInch => Reason::LooksLikePoundPerSquareInch,
            Unit::InchOfMercury => Reason::LooksLikeInchOfMercury,
            _ => Reason::LooksLikeOtherUnit,
        }
    }
}
