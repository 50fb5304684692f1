//! Every quantity and every limit, once: the checks, the messages and the documentation read this table.

/// Declares [`Quantity`] and its table.
macro_rules! quantities {
    ($($(#[$doc:meta])* $variant:ident = $code:literal, $name:literal, $unit:literal, $min:expr, $max:expr;)*) => {
        /// What a number means. The codes are stable and never re-used; those below [`PROPERTY_COUNT`] are properties of a
        /// state of moist air and can be read from it.
        #[derive(Clone, Copy, Debug, PartialEq, Eq, Hash)]
        #[non_exhaustive]
        #[repr(i32)]
        pub enum Quantity {
            $($(#[$doc])* $variant = $code,)*
        }

        impl Quantity {
            /// All quantities, in the order of their codes.
            pub const ALL: &'static [Self] = &[$(Self::$variant),*];

            /// The name used in messages and, with underscores, on the C and Python faces.
            #[must_use]
            pub const fn name(self) -> &'static str {
                match self { $(Self::$variant => $name,)* }
            }

            /// The unit of the C and Python faces, of messages and of [`Quantity::limits`].
            #[must_use]
            pub const fn unit(self) -> &'static str {
                match self { $(Self::$variant => $unit,)* }
            }

            /// The declared range of an input, both ends included; [`crate::Formulation::limits`] gives those of each formulation.
            #[must_use]
            pub const fn limits(self) -> (f64, f64) {
                match self { $(Self::$variant => ($min, $max),)* }
            }

            /// The stable code.
            #[must_use]
            pub const fn code(self) -> i32 {
                self as i32
            }

            /// The quantity with a given code.
            #[must_use]
            pub const fn from_code(code: i32) -> Option<Self> {
                match code {
                    $($code => Some(Self::$variant),)*
                    _ => None,
                }
            }
        }
    };
}

/// Codes below this number are properties of a state.
pub const PROPERTY_COUNT: i32 = 35;

const INFINITY: f64 = f64::INFINITY;

quantities! {
    /// Dry-bulb temperature. The range of states; IAPWS G8-10 itself reaches 193.15 to 473.15 K, as the Helmholtz formulation does.
    DryBulb = 0, "dry bulb", "°C", -80.0, 150.0;
    /// Absolute total pressure.
    Pressure = 1, "pressure", "Pa", 20_000.0, 1_100_000.0;
    /// Mass of water vapor per mass of dry air.
    HumidityRatio = 2, "humidity ratio", "kg/kg", 0.0, 10.0;
    /// Moles of water vapor per mole of moist air.
    WaterMoleFraction = 3, "water mole fraction", "1", 0.0, 0.95;
    /// Water mole fraction times total pressure.
    VaporPressure = 4, "vapor pressure", "Pa", 0.0, 1_045_000.0;
    /// Mass of water vapor per mass of moist air.
    SpecificHumidity = 5, "specific humidity", "kg/kg", 0.0, 10.0 / 11.0;
    /// Mass of water vapor per volume of moist air.
    AbsoluteHumidity = 6, "absolute humidity", "kg/m³", 0.0, 6.0;
    /// Enthalpy per mass of dry air.
    SpecificEnthalpy = 7, "specific enthalpy", "J/kg", -90_000.0, 30_000_000.0;
    /// Volume per mass of dry air.
    SpecificVolume = 8, "specific volume", "m³/kg", 0.04, 120.0;
    /// Mass of moist air per volume.
    Density = 9, "density", "kg/m³", 0.05, 25.0;
    /// Isobaric heat capacity per mass of dry air, at constant humidity ratio.
    SpecificHeat = 10, "specific heat", "J/(kg K)", 0.0, INFINITY;
    /// p v / (R T) of the mixture.
    CompressibilityFactor = 11, "compressibility factor", "1", 0.0, INFINITY;
    /// x_w / x_ws over the stable surface: ice below the melting temperature, liquid above. Over ice it may exceed one.
    RelativeHumidity = 12, "relative humidity", "1", 0.0, 1.6;
    /// x_w / x_ws over liquid water, supercooled below the melting temperature (WMO convention).
    RelativeHumidityOverLiquid = 13, "relative humidity over liquid", "1", 0.0, 1.03;
    /// W / W_s over the stable surface.
    DegreeOfSaturation = 14, "degree of saturation", "1", 0.0, 1.6;
    /// (x_ws − x_w) p over the stable surface.
    VaporPressureDeficit = 15, "vapor pressure deficit", "Pa", 0.0, INFINITY;
    /// Saturation pressure of pure water over the stable surface.
    SaturationPressure = 16, "saturation pressure", "Pa", 0.0, INFINITY;
    /// x_ws p over the saturation pressure of pure water.
    EnhancementFactor = 17, "enhancement factor", "1", 0.0, INFINITY;
    /// Thermodynamic wet bulb (adiabatic saturation), over liquid at or above the melting temperature, over ice below.
    WetBulb = 18, "wet bulb", "°C", -100.0, 160.0;
    /// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature.
    WetBulbOverLiquid = 19, "wet bulb over liquid", "°C", -40.0, 160.0;
    /// Thermodynamic wet bulb over ice.
    WetBulbOverIce = 20, "wet bulb over ice", "°C", -100.0, 0.01;
    /// Temperature of saturation over liquid water at the same pressure and composition.
    DewPoint = 21, "dew point", "°C", -40.0, 200.0;
    /// Temperature of saturation over ice at the same pressure and composition.
    FrostPoint = 22, "frost point", "°C", -100.0, 0.01;
    /// Entropy per mass of dry air.
    SpecificEntropy = 23, "specific entropy", "J/(kg K)", -INFINITY, INFINITY;
    /// Speed of sound at constant composition.
    SpeedOfSound = 24, "speed of sound", "m/s", 0.0, INFINITY;
    /// Isochoric heat capacity per mass of dry air, at constant humidity ratio.
    SpecificHeatAtConstantVolume = 25, "specific heat at constant volume", "J/(kg K)", 0.0, INFINITY;
    /// Chemical potential of the water in the gas, per mass of water.
    ChemicalPotentialOfWater = 26, "chemical potential of water", "J/kg", -INFINITY, INFINITY;
    /// Chemical potential of the dry air in the gas, per mass of dry air.
    ChemicalPotentialOfDryAir = 27, "chemical potential of dry air", "J/kg", -INFINITY, INFINITY;
    /// Fugacity of the water in the gas.
    FugacityOfWater = 28, "fugacity of water", "Pa", 0.0, INFINITY;
    /// Dynamic viscosity.
    DynamicViscosity = 29, "dynamic viscosity", "Pa s", 0.0, INFINITY;
    /// Thermal conductivity.
    ThermalConductivity = 30, "thermal conductivity", "W/(m K)", 0.0, INFINITY;
    /// Diffusivity of water vapor in air.
    VaporDiffusivity = 31, "vapor diffusivity", "m²/s", 0.0, INFINITY;
    /// c_p μ / λ, with the heat capacity per mass of moist air.
    PrandtlNumber = 32, "prandtl number", "1", 0.0, INFINITY;
    /// μ / (ρ D), of the vapor in the moist air.
    SchmidtNumber = 33, "schmidt number", "1", 0.0, INFINITY;
    /// Thermal diffusivity over the diffusivity of the vapor, λ / (ρ c_p D).
    LewisNumber = 34, "lewis number", "1", 0.0, INFINITY;

    /// Dry-air mass flow.
    DryAirFlow = 64, "dry-air mass flow", "kg/s", 0.0, 1.0e6;
    /// Volume flow at a stated state.
    VolumeFlow = 65, "volume flow", "m³/s", 0.0, 1.0e6;
    /// Reference density of a standard volume flow.
    StandardDensity = 66, "standard density", "kg/m³", 0.5, 2.0;
    /// Heat flow, positive into the air.
    HeatFlow = 67, "heat flow", "W", -1.0e12, 1.0e12;
    /// Flow of liquid water or steam.
    WaterFlow = 68, "water flow", "kg/s", 0.0, 1.0e6;
    /// Temperature of liquid water.
    WaterTemperature = 69, "water temperature", "°C", 0.0, 200.0;
    /// Specific enthalpy of steam, on the datum of liquid water at the triple point (0 °C for the ideal gas); at least that of
    /// water boiling at 20 kPa.
    SteamEnthalpy = 70, "steam enthalpy", "J/kg", 251_000.0, 4_000_000.0;
    /// Temperature that a process is to leave.
    LeavingTemperature = 71, "leaving temperature", "°C", -80.0, 150.0;
    /// Apparatus dew point of a coil.
    ApparatusDewPoint = 72, "apparatus dew point", "°C", -40.0, 150.0;
    /// Bypass factor of a coil.
    BypassFactor = 73, "bypass factor", "1", 0.0, 1.0;
    /// Saturation effectiveness of a humidifier.
    SaturationEffectiveness = 74, "saturation effectiveness", "1", 0.0, 1.0;
    /// Temperature at which condensate leaves.
    CondensateTemperature = 75, "condensate temperature", "°C", -40.0, 150.0;
    /// Elevation above mean sea level, range of the standard atmosphere's lowest layer (ISO 2533).
    Elevation = 76, "elevation", "m", -5_000.0, 11_000.0;
    /// Drift of a tower as a fraction of the circulating water.
    DriftFraction = 77, "drift fraction", "1", 0.0, 0.05;
    /// Concentration of the circulating water over that of the make-up.
    CyclesOfConcentration = 78, "cycles of concentration", "1", 1.0, 1_000.0;
    /// Temperature range of the water in a tower.
    TowerRange = 79, "tower range", "K", 0.0, 200.0;
    /// Total water per dry air, vapor and condensate.
    TotalWater = 80, "total water", "kg/kg", 0.0, 10.0;
    /// Specific enthalpy that a process leaves, with its condensate: down to that of ten times as much ice as dry air.
    LeavingEnthalpy = 81, "leaving enthalpy", "J/kg", -5_200_000.0, 30_000_000.0;
    /// Wet bulb as a psychrometer reads it; over ice not above the melting temperature.
    PsychrometerWetBulb = 82, "psychrometer wet bulb", "°C", -40.0, 100.0;
    /// Coefficient of a psychrometer, over water that at 0 °C.
    PsychrometerCoefficient = 83, "psychrometer coefficient", "1/K", 3e-4, 2e-3;
    /// Transfer units of a tower, K a V / L.
    MerkelNumber = 96, "Merkel number", "1", 0.0, 20.0;
    /// Water over dry air in a tower, L/G.
    WaterToAirRatio = 97, "water-to-air ratio", "1", 0.001, 20.0;
    /// Merkel number of a fill at a water-to-air ratio of one.
    FillCoefficient = 98, "fill coefficient", "1", 1.0e-3, 20.0;
    /// How the Merkel number of a fill falls with the water-to-air ratio.
    FillExponent = 99, "fill exponent", "1", 0.0, 2.0;
    /// Height of a fill.
    FillHeight = 100, "fill height", "m", 0.0, 100.0;
    /// Water in basin, pipes and plant together.
    WaterInventory = 101, "water inventory", "kg", 1.0e-3, 1.0e9;
    /// Of a dissolved salt; a conductivity serves as well.
    Concentration = 102, "concentration", "mg/kg", 0.0, 1.0e6;
    /// A span of time.
    Duration = 103, "duration", "s", 0.0, 1.0e9;
    /// Effectiveness of a tower as a heat exchanger of enthalpy.
    EnthalpyEffectiveness = 104, "enthalpy effectiveness", "1", 0.0, 1.0;
    /// Power of its flow that a conductance goes with.
    FlowExponent = 105, "flow exponent", "1", 0.0, 1.0;
    /// Temperature of a coolant other than water.
    CoolantTemperature = 106, "coolant temperature", "°C", -40.0, 200.0;
    /// Specific heat of a coolant other than water.
    CoolantSpecificHeat = 107, "coolant specific heat", "J/(kg K)", 500.0, 6_000.0;
    /// Thermal conductance of a coil: heat flow per difference of temperature.
    Conductance = 108, "conductance", "W/K", 0.0, 1.0e9;
    /// Conductance of the water side of a coil over that of its air side.
    ConductanceRatio = 109, "conductance ratio", "1", 1.0e-3, 1.0e3;
    /// Vapor over all of the water in wet steam, by mass.
    SteamQuality = 110, "steam quality", "1", 0.0, 1.0;
    /// Absolute pressure of steam; saturated at 7 to 201 °C.
    SteamPressure = 111, "steam pressure", "Pa", 1_000.0, 1_600_000.0;
    /// Temperature of superheated steam.
    SteamTemperature = 112, "steam temperature", "°C", 0.0, 400.0;
    /// (t₁ − t₂) over the drive of an indirect evaporative cooler; above one where the working air is cooled on the way.
    IndirectEffectiveness = 113, "indirect effectiveness", "1", 0.0, 2.0;
    /// Power of a pump, which ends as heat in its water.
    PumpHeat = 114, "pump heat", "W", 0.0, 1.0e9;
    /// Moisture that a room gives to its air.
    MoistureGain = 135, "moisture gain", "kg/s", -1.0e6, 1.0e6;
    /// Specific enthalpy of that moisture as it comes, from ice to steam.
    MoistureEnthalpy = 136, "moisture enthalpy", "J/kg", -500_000.0, 4_000_000.0;
    /// Sensible over total gain of a room; beyond 0 and 1 where one of the gains is negative.
    SensibleHeatRatio = 137, "sensible heat ratio", "1", -1.0e9, 1.0e9;
    /// Slope of a process line, change of enthalpy over change of humidity ratio.
    ProcessSlope = 138, "process slope", "J/kg", -1.0e15, 1.0e15;
    /// Heat of sorption over heat of vaporization.
    SorptionHeatRatio = 139, "sorption heat ratio", "1", 0.5, 3.0;
    /// Drying as a fraction of what a desiccant could do at best.
    DryingEffectiveness = 140, "drying effectiveness", "1", 0.0, 1.0;
    /// Effectiveness of a desiccant wheel in one of its two potentials.
    PotentialEffectiveness = 141, "potential effectiveness", "1", 0.0, 1.0;
    /// Rise of temperature by the heat that a wheel carries over from its regeneration.
    CarryOverRise = 142, "carry-over rise", "K", -100.0, 200.0;
    /// Temperature of air in the correlation of the wheel's potentials, 275 to 425 K.
    DesiccantTemperature = 143, "desiccant temperature", "°C", 1.85, 151.85;
    /// Dry air from outdoors over the dry air of a mixture.
    OutdoorAirFraction = 150, "outdoor-air fraction", "1", 0.0, 1.0;
    /// Standard uncertainty of a reading, in the unit of the reading.
    StandardUncertainty = 151, "standard uncertainty", "1", 0.0, 1.0e9;
    /// Share of a tracer gas, such as carbon dioxide, in dry air.
    TracerConcentration = 152, "tracer concentration", "µmol/mol", 0.0, 1.0e6;
    /// What a temperature must pass a limit by before a control switches on.
    TemperatureHysteresis = 153, "temperature hysteresis", "K", 0.0, 50.0;
    /// What an enthalpy must pass a limit by before a control switches on.
    EnthalpyHysteresis = 154, "enthalpy hysteresis", "J/kg", 0.0, 100_000.0;
    /// Heat that a coil takes out per dry air.
    CoilEnergy = 155, "coil energy", "J/kg", -INFINITY, INFINITY;
}

impl Quantity {
    /// The range of an input of the Helmholtz formulation: wider where 200 °C and 5 MPa make it so.
    #[cfg(any(feature = "helmholtz", test))]
    pub(crate) const fn limits_of_helmholtz(self) -> (f64, f64) {
        let (min, max) = self.limits();
        match self {
            Self::DryBulb
            | Self::WetBulb
            | Self::WetBulbOverLiquid
            | Self::LeavingTemperature
            | Self::ApparatusDewPoint
            | Self::CondensateTemperature => (min, 200.0),
            Self::Pressure => (min, 5_000_000.0),
            Self::VaporPressure => (min, 4_750_000.0),
            Self::AbsoluteHumidity => (min, 10.0),
            Self::SpecificEnthalpy => (-120_000.0, max),
            Self::SpecificVolume => (0.009, max),
            Self::Density => (min, 110.0),
            _ => (min, max),
        }
    }

    /// Whether the quantity is a property that can be read from a state.
    #[must_use]
    pub const fn is_property(self) -> bool {
        self.code() < PROPERTY_COUNT
    }

    /// Whether the quantity fixes a state together with dry bulb and pressure.
    #[must_use]
    pub const fn fixes_state(self) -> bool {
        matches!(
            self,
            Self::HumidityRatio
                | Self::WaterMoleFraction
                | Self::VaporPressure
                | Self::SpecificHumidity
                | Self::AbsoluteHumidity
                | Self::SpecificEnthalpy
                | Self::SpecificVolume
                | Self::Density
                | Self::RelativeHumidity
                | Self::RelativeHumidityOverLiquid
                | Self::DegreeOfSaturation
                | Self::WetBulb
                | Self::WetBulbOverLiquid
                | Self::WetBulbOverIce
                | Self::DewPoint
                | Self::FrostPoint
        )
    }

    /// What a value outside the range, or without a state, looks like, where one slip of the unit is common.
    #[must_use]
    pub fn likely_slip(self, value: f64) -> &'static str {
        match self {
            Self::RelativeHumidity | Self::RelativeHumidityOverLiquid | Self::DegreeOfSaturation
                if value > 1.03 && value <= 110.0 =>
            {
                "; a percentage? a fraction is expected"
            }
            Self::HumidityRatio if value > 1.0 => "; grams? kilograms per kilogram of dry air are expected",
            Self::Pressure if (80.0..=1_100.0).contains(&value) => {
                "; kilopascals or hectopascals? pascals are expected"
            }
            Self::Pressure if (2.0..=32.0).contains(&value) => "; bar, psi or inches of mercury? pascals are expected",
            Self::DryBulb if (190.0..=425.0).contains(&value) => "; kelvins? degrees Celsius are expected",
            Self::SpecificEnthalpy if value.abs() <= 3_000.0 => {
                "; kilojoules? joules per kilogram of dry air are expected"
            }
            _ => "",
        }
    }
}

/// Its name.
impl core::fmt::Display for Quantity {
    fn fmt(&self, f: &mut core::fmt::Formatter<'_>) -> core::fmt::Result {
        f.pad(self.name())
    }
}
