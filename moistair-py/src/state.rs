//! States of moist air: one, or an array of them.

use core::hash::{Hash, Hasher};
use std::hash::DefaultHasher;

use moistair_core::columns::{Column, NAN, StateColumns};
use moistair_core::{
    Basis, Bulb, Error, Formulation, HumidityRatio, MoistAir as Air, Pressure, Psychrometer, Quantity, Temperature,
};
use numpy::{PyArray1, PyArrayDyn, PyArrayMethods, PyReadwriteArrayDyn, PyUntypedArrayMethods};
use pyo3::CastIntoError;
use pyo3::exceptions::{PyTypeError, PyValueError};
use pyo3::prelude::*;
use pyo3::sync::PyOnceLock;
use pyo3::types::{PyDict, PyList, PyString, PyTuple, PyType};

use crate::column::{self, Arguments, plain_number};
use crate::derivatives;
use crate::error::{exception, identifier, internal, no_property, unknown_name, unknown_second};
use crate::process;

/// What fixes a state, as columns of one length; rows without a state hold NaN.
pub struct States {
    pub formulation: Formulation,
    pub shape: Vec<usize>,
    pub dry_bulb: Vec<f64>,
    pub pressure: Vec<f64>,
    pub humidity_ratio: Vec<f64>,
    pub status: Vec<i32>,
    pub failed: usize,
    /// Made by the constructor: a column call on the humidity ratio gives the same states again. What a process leaves may lie beyond
    /// saturation by a rounding, and is restored row by row.
    pub settled: bool,
}

pub enum Content {
    One(Air),
    Many(States),
}

/// Moist air without condensate at a pressure, a dry bulb and a second property, or two properties without the dry bulb: one
/// state, or an array of states.
///
/// Numbers make one state, whose attributes are floats; arrays (anything NumPy takes) are broadcast against each other and
/// make an array of states, whose attributes are float64 arrays of the common shape. Values come bit for bit the same
/// either way. float32 columns are taken, and computed in float64: differences of enthalpies would lose their digits otherwise.
///
/// Rows are paired by position. Columns of pandas are taken as arrays and must have equal labels; attributes are arrays in the
/// order of the rows, so that ``log["wet_bulb"] = air.wet_bulb`` fits.
///
/// Without ``dry_bulb``, two properties are given of which one states the vapor (humidity ratio, specific humidity, water mole
/// fraction, vapor pressure, dew point, frost point) and the other is a relative humidity (or degree of saturation), a wet bulb or
/// the specific enthalpy; or a relative humidity with a wet bulb or the specific enthalpy. Other pairs, such as dew point and humidity
/// ratio, fix no state, or only badly (wet bulb and enthalpy), and raise `UndeterminedError`. No two states have both properties;
/// just below the melting temperature ``wet_bulb`` is taken over ice, and ``wet_bulb_over_liquid`` gives the state of supercooled
/// liquid.
///
/// A state is immutable. One state raises where it cannot be made or where a property has no value. In an array a bad
/// row costs only itself: NaN, with its code in `status`; it warns of nothing, so look at `failed`. An attribute beyond what fixes
/// the state is computed whenever it is read: keep it, or take several at once by `properties`.
///
/// Parameters
/// ----------
/// pressure : float or array_like
///     Absolute pressure, Pa, 20 000 to 1 100 000. See `pressure_at_elevation`.
/// dry_bulb : float or array_like
///     Dry-bulb temperature, °C, −80 to 150 (to 200 with 'helmholtz').
/// relative_humidity : float or array_like
///     Fraction, over the stable surface: ice below the melting temperature, liquid above.
/// relative_humidity_over_liquid : float or array_like
///     Fraction, over liquid water at all temperatures, as instruments and weather records report it.
/// wet_bulb, wet_bulb_over_liquid, wet_bulb_over_ice : float or array_like
///     Thermodynamic wet bulb, °C.
/// dew_point : float or array_like
///     °C, over liquid water.
/// frost_point : float or array_like
///     °C, over ice.
/// humidity_ratio : float or array_like
///     kg of water vapor per kg of dry air.
/// specific_humidity : float or array_like
///     kg of water vapor per kg of moist air.
/// absolute_humidity : float or array_like
///     kg of water vapor per m³.
/// vapor_pressure : float or array_like
///     Pa.
/// water_mole_fraction : float or array_like
///     Moles of vapor per mole of moist air.
/// degree_of_saturation : float or array_like
///     W / W_s, over the stable surface.
/// specific_enthalpy : float or array_like
///     J per kg of dry air.
/// specific_volume : float or array_like
///     m³ per kg of dry air.
/// density : float or array_like
///     Of the moist air, kg/m³.
/// formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
///     Virial mixture after IAPWS G8-10, the handbook's perfect-gas relations, or IAPWS G8-10 as published: slower, to 200 °C and
///     5 MPa. See `limits`.
///
/// Raises
/// ------
/// TypeError
///     Not exactly two properties beside the pressure, or something that is not a number.
/// ValueError
///     Shapes that do not match, an unknown formulation.
/// UndeterminedError
///     Two properties that fix no state.
/// NotFiniteError, OutOfRangeError, UnattainableError, NoValueError
///     One state that cannot be made: an argument that is no number, is out of range, is beyond what the air can hold, or has no
///     meaning there, as a relative humidity above boiling.
///
/// Examples
/// --------
/// >>> import moistair
/// >>> air = moistair.MoistAir(dry_bulb=34.0, relative_humidity=0.38, pressure=83_500.0)
/// >>> f"{air.wet_bulb:.1f} °C, {air.specific_enthalpy / 1000:.1f} kJ/kg"
/// '22.1 °C, 74.0 kJ/kg'
/// >>> column = moistair.MoistAir(dry_bulb=[20.0, 25.0, 900.0], relative_humidity=0.5, pressure=101_325.0)
/// >>> column.dew_point.round(2)
/// array([ 9.27, 13.87,   nan])
/// >>> column.status
/// array([  0,   0, 202], dtype=int32)
/// >>> store = moistair.MoistAir(dew_point=2.0, relative_humidity=0.85, pressure=101_325.0)
/// >>> round(store.dry_bulb, 2)
/// 4.3
#[pyclass(frozen, weakref, module = "moistair")]
pub struct MoistAir {
    content: Content,
}

/// What may stand beside the dry bulb, or two of it, in the order of the constructor's arguments.
const SECOND: [Quantity; 16] = [
    Quantity::RelativeHumidity,
    Quantity::RelativeHumidityOverLiquid,
    Quantity::WetBulb,
    Quantity::WetBulbOverLiquid,
    Quantity::WetBulbOverIce,
    Quantity::DewPoint,
    Quantity::FrostPoint,
    Quantity::HumidityRatio,
    Quantity::SpecificHumidity,
    Quantity::AbsoluteHumidity,
    Quantity::VaporPressure,
    Quantity::WaterMoleFraction,
    Quantity::DegreeOfSaturation,
    Quantity::SpecificEnthalpy,
    Quantity::SpecificVolume,
    Quantity::Density,
];

#[pymethods]
impl MoistAir {
    #[new]
    #[pyo3(signature = (*, pressure, dry_bulb=None, relative_humidity=None, relative_humidity_over_liquid=None, wet_bulb=None,
        wet_bulb_over_liquid=None, wet_bulb_over_ice=None, dew_point=None, frost_point=None, humidity_ratio=None,
        specific_humidity=None, absolute_humidity=None, vapor_pressure=None, water_mole_fraction=None,
        degree_of_saturation=None, specific_enthalpy=None, specific_volume=None, density=None, formulation="real_gas"))]
    #[allow(clippy::too_many_arguments, reason = "each is a keyword of Python")]
    fn new<'py>(
        py: Python<'py>,
        pressure: Bound<'py, PyAny>,
        dry_bulb: Option<Bound<'py, PyAny>>,
        relative_humidity: Option<Bound<'py, PyAny>>,
        relative_humidity_over_liquid: Option<Bound<'py, PyAny>>,
        wet_bulb: Option<Bound<'py, PyAny>>,
        wet_bulb_over_liquid: Option<Bound<'py, PyAny>>,
        wet_bulb_over_ice: Option<Bound<'py, PyAny>>,
        dew_point: Option<Bound<'py, PyAny>>,
        frost_point: Option<Bound<'py, PyAny>>,
        humidity_ratio: Option<Bound<'py, PyAny>>,
        specific_humidity: Option<Bound<'py, PyAny>>,
        absolute_humidity: Option<Bound<'py, PyAny>>,
        vapor_pressure: Option<Bound<'py, PyAny>>,
        water_mole_fraction: Option<Bound<'py, PyAny>>,
        degree_of_saturation: Option<Bound<'py, PyAny>>,
        specific_enthalpy: Option<Bound<'py, PyAny>>,
        specific_volume: Option<Bound<'py, PyAny>>,
        density: Option<Bound<'py, PyAny>>,
        formulation: &str,
    ) -> PyResult<Self> {
        let formulation = formulation_named(formulation)?;
        let given = [
            relative_humidity,
            relative_humidity_over_liquid,
            wet_bulb,
            wet_bulb_over_liquid,
            wet_bulb_over_ice,
            dew_point,
            frost_point,
            humidity_ratio,
            specific_humidity,
            absolute_humidity,
            vapor_pressure,
            water_mole_fraction,
            degree_of_saturation,
            specific_enthalpy,
            specific_volume,
            density,
        ];
        let [first, second] = two_of(dry_bulb, given)?;
        let fixing = Fixing { first: first.0, second: second.0, formulation };
        let (first, second) = (first.1, second.1);
        if let (Some(a), Some(b), Some(p)) = (plain_number(&first), plain_number(&second), plain_number(&pressure)) {
            return fixing.one(py, a?, b?, p?);
        }
        let names = [&identifier(fixing.first), &identifier(fixing.second), "pressure"];
        let arguments = Arguments::read(py, &names, &[first, second, pressure])?;
        let columns = arguments.columns()?;
        let [first, second, pressure] = columns[..] else { return Err(internal("three columns expected")) };
        if arguments.shape.is_empty() {
            let only = |column: Column| column.get(0).unwrap_or(NAN);
            return fixing.one(py, only(first), only(second), only(pressure));
        }
        let shape = arguments.shape.clone();
        let states = if fixing.first == Quantity::DryBulb {
            let inputs = StateColumns { dry_bulb: first, property: fixing.second, second, pressure, formulation };
            States::compute(py, shape, arguments.rows, inputs)?
        } else {
            fixing.many(py, shape, arguments.rows, [first, second, pressure])?
        };
        Ok(Content::Many(states).into())
    }

    /// A state from what a psychrometer shows, by the equation of WMO-No. 8 (coefficients from memory),
    /// x_w p = x_ws(t_w) p − A p (t − t_w), over water with A (1 + 0.000 944 t_w), and the saturation of the formulation.
    ///
    /// The wet bulb of a psychrometer is not the thermodynamic one, `wet_bulb`, though an aspirated instrument comes within a few tenths of
    /// a kelvin of it. An ice bulb may read above the dry bulb, where the vapor is supersaturated over ice.
    ///
    /// Parameters
    /// ----------
    /// dry_bulb, wet_bulb : float or array_like
    ///     Readings, °C; the wet bulb −40 to 100.
    /// pressure : float or array_like
    ///     Absolute pressure, Pa.
    /// bulb : {'water', 'ice'}
    ///     What the wetted bulb is covered with; below the melting temperature it may be either, one must look.
    /// coefficient : float or array_like, optional
    ///     A, 1/K, 3e-4 to 2e-3 (over water that at 0 °C). By default that of an aspirated instrument, 3 to 5 m/s over shielded bulbs:
    ///     6.53e-4 over water, 5.75e-4 over ice. About 8e-4 in a naturally ventilated screen, 1.2e-3 in still air (common practice, no
    ///     source).
    /// formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
    ///     As in the constructor.
    ///
    /// Raises
    /// ------
    /// UnattainableError
    ///     Negative vapor, more than the air holds, or ice above its melting temperature.
    /// NoValueError
    ///     No reading is possible: air colder than −40 °C, or too warm for ice.
    /// NotFiniteError, OutOfRangeError
    ///     An input.
    ///
    /// Examples
    /// --------
    /// >>> import moistair
    /// >>> air = moistair.MoistAir.from_psychrometer(dry_bulb=20.0, wet_bulb=15.0, pressure=101_325.0)
    /// >>> round(air.relative_humidity, 3)
    /// 0.587
    #[staticmethod]
    #[pyo3(signature = (*, dry_bulb, wet_bulb, pressure, bulb="water", coefficient=None, formulation="real_gas"))]
    fn from_psychrometer<'py>(
        py: Python<'py>,
        dry_bulb: Bound<'py, PyAny>,
        wet_bulb: Bound<'py, PyAny>,
        pressure: Bound<'py, PyAny>,
        bulb: &str,
        coefficient: Option<Bound<'py, PyAny>>,
        formulation: &str,
    ) -> PyResult<Bound<'py, PyAny>> {
        let (bulb, coefficient) = psychrometer(py, bulb, coefficient)?;
        let arguments = [
            ("dry_bulb", dry_bulb),
            ("wet_bulb", wet_bulb),
            ("bulb", bulb),
            ("coefficient", coefficient),
            ("pressure", pressure),
        ];
        only_result_of(py, "air.from_psychrometer", "S", arguments, formulation_named(formulation)?)
    }

    /// What the wetted bulb of a psychrometer would show in this air, °C: the inverse of `from_psychrometer`.
    ///
    /// Parameters
    /// ----------
    /// bulb : {'water', 'ice'}
    ///     What the wetted bulb is covered with.
    /// coefficient : float or array_like, optional
    ///     As in `from_psychrometer`.
    ///
    /// Raises
    /// ------
    /// NoValueError
    ///     The reading would lie outside −40 to 100 °C, ice melt, or water boil.
    ///
    /// Examples
    /// --------
    /// >>> import moistair
    /// >>> air = moistair.MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=101_325.0)
    /// >>> round(air.psychrometer_reading(), 2), round(air.wet_bulb, 2)
    /// (13.83, 13.78)
    #[pyo3(signature = (*, bulb="water", coefficient=None))]
    fn psychrometer_reading<'py>(
        slf: Bound<'py, Self>,
        bulb: &str,
        coefficient: Option<Bound<'py, PyAny>>,
    ) -> PyResult<Bound<'py, PyAny>> {
        let py = slf.py();
        let (bulb, coefficient) = psychrometer(py, bulb, coefficient)?;
        let arguments = [("air", slf.into_any()), ("bulb", bulb), ("coefficient", coefficient)];
        only_result(py, "air.psychrometer_reading", "N", arguments)
    }

    /// This air at another pressure, Pa, with the same temperature and humidity ratio.
    ///
    /// Raises
    /// ------
    /// UnattainableError
    ///     Water would condense: see `moistair.process.compression`.
    /// NotFiniteError, OutOfRangeError
    ///     The pressure.
    ///
    /// Examples
    /// --------
    /// >>> import moistair
    /// >>> room = moistair.MoistAir(dry_bulb=20.0, relative_humidity=0.1, pressure=100_000.0)
    /// >>> round(room.at_pressure(700_000.0).relative_humidity, 2)
    /// 0.69
    fn at_pressure<'py>(slf: Bound<'py, Self>, pressure: Bound<'py, PyAny>) -> PyResult<Bound<'py, PyAny>> {
        let py = slf.py();
        only_result(py, "air.at_pressure", "S", [("air", slf.into_any()), ("pressure", pressure)])
    }

    /// This air at another temperature, °C, and pressure, Pa, with the same humidity ratio.
    ///
    /// Raises
    /// ------
    /// UnattainableError
    ///     Water would condense: see `moistair.process.compression`.
    /// NotFiniteError, OutOfRangeError
    ///     The temperature or the pressure.
    #[pyo3(signature = (*, dry_bulb, pressure))]
    fn at_temperature_and_pressure<'py>(
        slf: Bound<'py, Self>,
        dry_bulb: Bound<'py, PyAny>,
        pressure: Bound<'py, PyAny>,
    ) -> PyResult<Bound<'py, PyAny>> {
        let py = slf.py();
        let arguments = [("air", slf.into_any()), ("dry_bulb", dry_bulb), ("pressure", pressure)];
        only_result(py, "air.at_temperature_and_pressure", "S", arguments)
    }

    /// Dew point of this air at another pressure, Pa: the pressure dew point of a compressed-air line, or the atmospheric one of air in it.
    /// Above the temperature there it says that water condenses. °C, −40 and above; no value for dry air.
    ///
    /// Examples
    /// --------
    /// >>> import moistair
    /// >>> outdoor = moistair.MoistAir(dry_bulb=20.0, relative_humidity=0.5, pressure=100_000.0)
    /// >>> round(outdoor.dew_point_at(800_000.0), 1)
    /// 44.2
    fn dew_point_at<'py>(slf: Bound<'py, Self>, pressure: Bound<'py, PyAny>) -> PyResult<Bound<'py, PyAny>> {
        let py = slf.py();
        only_result(py, "air.dew_point_at", "N", [("air", slf.into_any()), ("pressure", pressure)])
    }

    /// Frost point of this air at another pressure, Pa: °C, −100 to the melting temperature. No value for dry air.
    fn frost_point_at<'py>(slf: Bound<'py, Self>, pressure: Bound<'py, PyAny>) -> PyResult<Bound<'py, PyAny>> {
        let py = slf.py();
        only_result(py, "air.frost_point_at", "N", [("air", slf.into_any()), ("pressure", pressure)])
    }

    /// Dry-bulb temperature, °C; bit for bit as given.
    #[getter]
    fn dry_bulb<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::DryBulb)
    }

    /// Absolute pressure, Pa.
    #[getter]
    fn pressure<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::Pressure)
    }

    /// Humidity ratio W, kg of water vapor per kg of dry air.
    #[getter]
    fn humidity_ratio<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::HumidityRatio)
    }

    /// Water mole fraction x_w, moles of vapor per mole of moist air.
    #[getter]
    fn water_mole_fraction<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::WaterMoleFraction)
    }

    /// Vapor pressure x_w p, Pa.
    #[getter]
    fn vapor_pressure<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::VaporPressure)
    }

    /// Specific humidity, kg of water vapor per kg of moist air.
    #[getter]
    fn specific_humidity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificHumidity)
    }

    /// Absolute humidity, kg of water vapor per m³.
    #[getter]
    fn absolute_humidity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::AbsoluteHumidity)
    }

    /// Specific enthalpy h, J per kg of dry air. Datum: dry air at 0 °C, liquid water at the triple point (0 °C for
    /// the ideal gas).
    #[getter]
    fn specific_enthalpy<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificEnthalpy)
    }

    /// Specific volume v, m³ per kg of dry air.
    #[getter]
    fn specific_volume<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificVolume)
    }

    /// Density of the moist air, kg/m³.
    #[getter]
    fn density<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::Density)
    }

    /// Isobaric heat capacity at constant humidity ratio, J/K per kg of dry air.
    #[getter]
    fn specific_heat<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificHeat)
    }

    /// Compressibility factor p v / (R T) of the mixture; 1 for the ideal gas.
    #[getter]
    fn compressibility_factor<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::CompressibilityFactor)
    }

    /// Specific entropy, J/K per kilogram of dry air. Zero: dry air at 0 °C and 101 325 Pa, liquid water at the triple point.
    #[getter]
    fn specific_entropy<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificEntropy)
    }

    /// Speed of sound, m/s, at constant composition.
    #[getter]
    fn speed_of_sound<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpeedOfSound)
    }

    /// Isochoric heat capacity at constant humidity ratio, J/K per kg of dry air.
    #[getter]
    fn specific_heat_at_constant_volume<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SpecificHeatAtConstantVolume)
    }

    /// Chemical potential of the water in the gas, J per kg of water, on the datum of enthalpy and entropy. At saturation that of
    /// the condensed phase (not with the ideal gas). No value for dry air.
    #[getter]
    fn chemical_potential_of_water<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::ChemicalPotentialOfWater)
    }

    /// Chemical potential of the dry air in the gas, J per kg of dry air, on the datum of enthalpy and entropy.
    #[getter]
    fn chemical_potential_of_dry_air<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::ChemicalPotentialOfDryAir)
    }

    /// Fugacity of the water in the gas, Pa; zero for dry air, x_w p for the ideal gas.
    #[getter]
    fn fugacity_of_water<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::FugacityOfWater)
    }

    /// Dynamic viscosity μ, Pa s. Dry air by Lemmon & Jacobsen 2004 (1 %), vapor by IAPWS R12-08 (2 %), mixed by Wilke's rule (a few
    /// percent in hot and humid air). Below 0 °C the vapor's part extrapolates.
    #[getter]
    fn dynamic_viscosity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::DynamicViscosity)
    }

    /// Thermal conductivity λ, W/(m K). Dry air by Lemmon & Jacobsen 2004 (2 %), vapor by IAPWS R15-11 (2 %), mixed by Wassiljewa's
    /// rule with the weights of Mason & Saxena (a few percent in hot and humid air). Below 0 °C the vapor's part extrapolates.
    #[getter]
    fn thermal_conductivity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::ThermalConductivity)
    }

    /// Diffusivity D of water vapor in air, m²/s: Massman 1998 (constants from memory), 0 to 100 °C near atmospheric pressure within
    /// about 7 %; it extrapolates elsewhere.
    #[getter]
    fn vapor_diffusivity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::VaporDiffusivity)
    }

    /// Prandtl number c_p μ / λ, the heat capacity per mass of moist air.
    #[getter]
    fn prandtl_number<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::PrandtlNumber)
    }

    /// Schmidt number μ / (ρ D) of the vapor in the moist air.
    #[getter]
    fn schmidt_number<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SchmidtNumber)
    }

    /// Lewis number λ / (ρ c_p D): thermal diffusivity over the diffusivity of the vapor (some define the inverse).
    #[getter]
    fn lewis_number<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::LewisNumber)
    }

    /// Relative humidity x_w / x_ws, a fraction, over the stable surface: ice below the melting temperature, liquid
    /// above. Over ice it may exceed one. No value above boiling.
    #[getter]
    fn relative_humidity<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::RelativeHumidity)
    }

    /// Relative humidity x_w / x_ws, a fraction, over liquid water, supercooled below the melting temperature
    /// (convention of WMO-No. 8). No value below −40 °C or above boiling.
    #[getter]
    fn relative_humidity_over_liquid<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::RelativeHumidityOverLiquid)
    }

    /// Degree of saturation W / W_s, a fraction, over the stable surface. No value above boiling.
    #[getter]
    fn degree_of_saturation<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::DegreeOfSaturation)
    }

    /// Vapor pressure deficit (x_ws − x_w) p, Pa, over the stable surface; negative where supersaturated over ice.
    /// No value above boiling.
    #[getter]
    fn vapor_pressure_deficit<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::VaporPressureDeficit)
    }

    /// Saturation pressure of pure water at this temperature, Pa, over the stable surface.
    #[getter]
    fn saturation_pressure<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::SaturationPressure)
    }

    /// Enhancement factor: x_ws p over the saturation pressure of pure water; 1 for the ideal gas. No value above
    /// boiling.
    #[getter]
    fn enhancement_factor<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::EnhancementFactor)
    }

    /// Thermodynamic wet bulb (adiabatic saturation), °C: over liquid where that one is at or above the melting
    /// temperature, over ice otherwise.
    #[getter]
    fn wet_bulb<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::WetBulb)
    }

    /// Thermodynamic wet bulb over liquid water, supercooled below the melting temperature, °C. No value below −40
    /// °C.
    #[getter]
    fn wet_bulb_over_liquid<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::WetBulbOverLiquid)
    }

    /// Thermodynamic wet bulb over ice, °C. No value above the melting temperature.
    #[getter]
    fn wet_bulb_over_ice<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::WetBulbOverIce)
    }

    /// Dew point, °C: always over liquid water, −40 °C and above. No value for dry air.
    #[getter]
    fn dew_point<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::DewPoint)
    }

    /// Frost point, °C: always over ice, −100 °C to the melting temperature. No value for dry air.
    #[getter]
    fn frost_point<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        self.value(py, Quantity::FrostPoint)
    }

    /// Which formulation: 'real_gas', 'ideal_gas' or 'helmholtz'.
    #[getter]
    fn formulation(&self) -> &'static str {
        formulation_name(self.formulation_())
    }

    /// Shape of the attributes; ``()`` for one state.
    #[getter]
    fn shape<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyTuple>> {
        PyTuple::new(py, self.shape_())
    }

    /// Number of states.
    #[getter]
    fn size(&self) -> usize {
        match &self.content {
            Content::One(_) => 1,
            Content::Many(states) => states.status.len(),
        }
    }

    /// Why a row has no state: 0 where it has one, else the code of the error. An int32 array; 0 for one state.
    ///
    /// 201 is what raises NotFiniteError for one state, 202 OutOfRangeError, 203 and 210 UnattainableError, 209 UndeterminedError, 310 to
    /// 314 NoValueError.
    /// Processes add 205 to 207 (ProcessError) and 301 (InfeasibleError). That a property has no value at a valid state is no
    /// failure of the row: the property is NaN, its status 0.
    #[getter]
    fn status<'py>(&self, py: Python<'py>) -> PyResult<Bound<'py, PyAny>> {
        match &self.content {
            Content::One(_) => Ok(0_i32.into_pyobject(py)?.into_any()),
            Content::Many(states) => column::array(py, states.status.clone(), &states.shape),
        }
    }

    /// Number of rows without a state.
    #[getter]
    fn failed(&self) -> usize {
        match &self.content {
            Content::One(_) => 0,
            Content::Many(states) => states.failed,
        }
    }

    /// Several properties in one pass, which shares their common work.
    ///
    /// Parameters
    /// ----------
    /// *names : str
    ///     Names of properties, as the attributes are called.
    /// out : dict of str to numpy.ndarray, optional
    ///     Arrays to write to, one for each name, of the shape of the states: the dictionary of an earlier call, for
    ///     one. float64 arrays that are contiguous are written directly; others, float32 among them, at the end.
    ///
    /// Returns
    /// -------
    /// dict of str to float or numpy.ndarray
    ///     `out` itself where it is given. NaN where a row has no value; one state raises instead.
    ///
    /// Raises
    /// ------
    /// UnknownNameError
    ///     A name that is no property.
    /// NoValueError
    ///     One state, and a property that has no meaning there.
    /// TypeError, ValueError
    ///     `out` does not fit.
    ///
    /// Examples
    /// --------
    /// >>> import moistair
    /// >>> day = moistair.MoistAir(dry_bulb=[10.0, 20.0], dew_point=[5.0, 12.0], pressure=101_325.0)
    /// >>> columns = day.properties("relative_humidity", "wet_bulb")
    /// >>> columns["wet_bulb"].round(2)
    /// array([ 7.49, 15.13])
    /// >>> again = day.properties("relative_humidity", "wet_bulb", out=columns)
    /// >>> again is columns
    /// True
    #[pyo3(signature = (*names, out=None))]
    fn properties<'py>(
        &self,
        py: Python<'py>,
        names: &Bound<'py, PyTuple>,
        out: Option<Bound<'py, PyDict>>,
    ) -> PyResult<Bound<'py, PyDict>> {
        let names = property_names(names)?;
        let quantities = properties_named(py, &names)?;
        match (&self.content, out) {
            (Content::One(air), None) => properties_of_one(py, air, &names, quantities),
            (Content::One(_), Some(_)) => Err(PyTypeError::new_err("out is for arrays of states; this is one state")),
            (Content::Many(states), None) => {
                let result = PyDict::new(py);
                for (name, column) in names.iter().zip(states.properties(py, &quantities)?) {
                    result.set_item(name, column::array(py, column, &states.shape)?)?;
                }
                Ok(result)
            }
            (Content::Many(states), Some(out)) => {
                states.properties_into(py, &names, &quantities, &out)?;
                Ok(out)
            }
        }
    }

    /// Exact partial derivatives of properties with respect to dry bulb, a second property and pressure: how sensitive a state made of
    /// these three is to each of them.
    ///
    /// The formulas are differentiated, not their values: nothing is lost to a difference of neighbors. Where a property has a
    /// kink, the derivative is that of one side: at the melting temperature and above over liquid, below over ice; at saturation
    /// towards less vapor; in dry air towards more.
    ///
    /// Parameters
    /// ----------
    /// *names : str
    ///     Names of properties, as the attributes are called.
    /// second : str
    ///     The second property: the name of one that fixes a state beside dry bulb and pressure, whether this one was made by it or not.
    ///
    /// Returns
    /// -------
    /// dict of str to PropertyDerivatives
    ///     Each with `value`, `by_dry_bulb`, `by_second`, `by_pressure`: floats, or arrays of the shape of the states. NaN where a
    ///     row has no value; one state raises instead.
    ///
    /// Raises
    /// ------
    /// UnknownNameError
    ///     A name that is no property, a second property that does not fix a state.
    /// NoValueError
    ///     One state, and a property that has no meaning there, or (the entropy of dry air) no slope.
    ///
    /// Examples
    /// --------
    /// What an error of 0.3 K and 2 % is worth in the dew point:
    ///
    /// >>> import math
    /// >>> import moistair
    /// >>> air = moistair.MoistAir(dry_bulb=24.0, relative_humidity=0.5, pressure=101_325.0)
    /// >>> slopes = air.derivatives("dew_point", second="relative_humidity")["dew_point"]
    /// >>> round(math.hypot(0.3 * slopes.by_dry_bulb, 0.02 * slopes.by_second), 2)
    /// 0.67
    #[pyo3(signature = (*names, second))]
    fn derivatives<'py>(
        &self,
        py: Python<'py>,
        names: &Bound<'py, PyTuple>,
        second: &str,
    ) -> PyResult<Bound<'py, PyDict>> {
        let names = property_names(names)?;
        let quantities = properties_named(py, &names)?;
        let second = property_named(second)
            .filter(|quantity| quantity.fixes_state())
            .ok_or_else(|| unknown_second(py, second))?;
        match &self.content {
            Content::One(air) => derivatives::of_one(py, air, &names, quantities, second),
            Content::Many(states) => derivatives::of_many(py, states, &names, &quantities, second),
        }
    }

    fn __eq__(&self, other: &Self) -> bool {
        self.key() == other.key()
    }

    fn __hash__(&self) -> u64 {
        let mut hasher = DefaultHasher::new();
        self.key().hash(&mut hasher);
        hasher.finish()
    }

    fn __repr__(&self) -> String {
        let formulation = formulation_name(self.formulation_());
        match &self.content {
            Content::One(air) => format!(
                "MoistAir(dry_bulb={:?}, humidity_ratio={:?}, pressure={:?}, formulation='{formulation}')",
                air.dry_bulb().celsius(),
                air.humidity_ratio().kilograms_per_kilogram(),
                air.pressure().pascals(),
            ),
            Content::Many(states) => {
                let shape = states.shape.iter().map(|length| format!("{length},")).collect::<String>();
                format!("<MoistAir array: shape=({shape}), failed={}, formulation='{formulation}'>", states.failed)
            }
        }
    }

    fn __copy__(slf: Bound<'_, Self>) -> Bound<'_, Self> {
        slf
    }

    fn __deepcopy__<'py>(slf: Bound<'py, Self>, _memo: &Bound<'py, PyAny>) -> Bound<'py, Self> {
        slf
    }

    fn __reduce__<'py>(slf: &Bound<'py, Self>) -> PyResult<(Bound<'py, PyAny>, Bound<'py, PyTuple>)> {
        let py = slf.py();
        let this = slf.get();
        let restore = py.import("moistair._core")?.getattr("restore_state")?;
        let code = this.formulation_().code();
        let parts = match &this.content {
            Content::One(air) => {
                let ratio = air.humidity_ratio().kilograms_per_kilogram();
                (code, (), air.dry_bulb().celsius(), air.pressure().pascals(), ratio, 0).into_pyobject(py)?
            }
            Content::Many(states) => {
                let shape = PyTuple::new(py, &states.shape)?;
                let column = |values: &Vec<f64>| column::array(py, values.clone(), &[values.len()]);
                let (t, p, w) = (column(&states.dry_bulb)?, column(&states.pressure)?, column(&states.humidity_ratio)?);
                let status = column::array(py, states.status.clone(), &[states.status.len()])?;
                (code, shape, t, p, w, status).into_pyobject(py)?
            }
        };
        Ok((restore, parts))
    }

    /// ``MoistAir[float]`` and ``MoistAir[numpy.ndarray]``, for annotations.
    #[classmethod]
    fn __class_getitem__<'py>(cls: &Bound<'py, PyType>, item: Bound<'py, PyAny>) -> PyResult<Bound<'py, PyAny>> {
        cls.py().import("types")?.getattr("GenericAlias")?.call1((cls, item))
    }
}

impl From<Content> for MoistAir {
    fn from(content: Content) -> Self {
        Self { content }
    }
}

impl MoistAir {
    pub fn content(&self) -> &Content {
        &self.content
    }

    fn value<'py>(&self, py: Python<'py>, quantity: Quantity) -> PyResult<Bound<'py, PyAny>> {
        match &self.content {
            Content::One(air) => {
                let value = air.value(quantity).map_err(|error| exception(py, &error))?;
                Ok(value.into_pyobject(py)?.into_any())
            }
            Content::Many(states) => {
                let column =
                    states.properties(py, &[quantity])?.pop().ok_or_else(|| internal("one column expected"))?;
                column::array(py, column, &states.shape)
            }
        }
    }

    fn formulation_(&self) -> Formulation {
        match &self.content {
            Content::One(air) => air.formulation(),
            Content::Many(states) => states.formulation,
        }
    }

    fn shape_(&self) -> &[usize] {
        match &self.content {
            Content::One(_) => &[],
            Content::Many(states) => &states.shape,
        }
    }

    /// What makes two states equal: the same formulation, shape and numbers. A row without a state equals its like.
    fn key(&self) -> (i32, &[usize], Vec<u64>, &[i32]) {
        // Adding zero makes −0 plain zero.
        let bits = |value: f64| if value.is_nan() { NAN.to_bits() } else { (value + 0.0).to_bits() };
        let code = self.formulation_().code();
        match &self.content {
            Content::One(air) => {
                let ratio = air.humidity_ratio().kilograms_per_kilogram();
                let numbers = [air.dry_bulb().celsius(), air.pressure().pascals(), ratio];
                (code, &[], numbers.map(bits).to_vec(), &[])
            }
            Content::Many(states) => {
                let columns = [&states.dry_bulb, &states.pressure, &states.humidity_ratio];
                let numbers = columns.iter().flat_map(|column| column.iter().copied().map(bits)).collect();
                (code, &states.shape, numbers, &states.status)
            }
        }
    }
}

impl States {
    /// Makes the states of `rows` rows.
    pub fn compute(py: Python<'_>, shape: Vec<usize>, rows: usize, inputs: StateColumns<'_>) -> PyResult<Self> {
        let [mut dry_bulb, mut pressure, mut humidity_ratio] =
            [column::blank(rows, NAN)?, column::blank(rows, NAN)?, column::blank(rows, NAN)?];
        let mut status = column::blank(rows, 0)?;
        let report = py.detach(|| {
            inputs.compute(
                rows,
                &[Quantity::DryBulb, Quantity::Pressure, Quantity::HumidityRatio],
                &mut [&mut dry_bulb, &mut pressure, &mut humidity_ratio],
                Some(&mut status),
            )
        });
        let failed = report.map_err(internal)?.failed;
        Ok(Self {
            formulation: inputs.formulation,
            shape,
            dry_bulb,
            pressure,
            humidity_ratio,
            status,
            failed,
            settled: true,
        })
    }

    fn set(&mut self, row: usize, air: &Air) {
        let parts = [
            (&mut self.dry_bulb, air.dry_bulb().celsius()),
            (&mut self.pressure, air.pressure().pascals()),
            (&mut self.humidity_ratio, air.humidity_ratio().kilograms_per_kilogram()),
        ];
        for (column, value) in parts {
            if let Some(place) = column.get_mut(row) {
                *place = value;
            }
        }
    }

    fn fail(&mut self, row: usize, code: i32) {
        self.failed += 1;
        if let Some(place) = self.status.get_mut(row) {
            *place = code;
        }
    }

    fn inputs(&self) -> StateColumns<'_> {
        StateColumns {
            dry_bulb: Column::new(&self.dry_bulb),
            property: Quantity::HumidityRatio,
            second: Column::new(&self.humidity_ratio),
            pressure: Column::new(&self.pressure),
            formulation: self.formulation,
        }
    }

    fn write(&self, py: Python<'_>, quantities: &[Quantity], outputs: &mut [&mut [f64]]) -> PyResult<()> {
        if self.copied(quantities, outputs) {
            return Ok(());
        }
        if self.settled {
            let report = py.detach(|| self.inputs().compute(self.status.len(), quantities, outputs, None));
            return report.map(|_| ()).map_err(internal);
        }
        py.detach(|| {
            for row in 0..self.status.len() {
                let mut places = outputs.iter_mut().map(|output| output.get_mut(row));
                let mut put = |value| {
                    if let Some(Some(place)) = places.next() {
                        *place = value;
                    }
                };
                match self.row(row) {
                    Some(air) => air.values(quantities.iter().copied(), |_, value| put(value.unwrap_or(NAN))),
                    None => quantities.iter().for_each(|_| put(NAN)),
                }
            }
        });
        Ok(())
    }

    /// Copies what the states are made of, when nothing else is asked for.
    fn copied(&self, quantities: &[Quantity], outputs: &mut [&mut [f64]]) -> bool {
        let kept = |quantity: &Quantity| match quantity {
            Quantity::DryBulb => Some(&self.dry_bulb),
            Quantity::Pressure => Some(&self.pressure),
            Quantity::HumidityRatio => Some(&self.humidity_ratio),
            _ => None,
        };
        let Some(columns) = quantities.iter().map(kept).collect::<Option<Vec<_>>>() else { return false };
        for (output, column) in outputs.iter_mut().zip(columns) {
            output.iter_mut().zip(column).for_each(|(place, value)| *place = *value);
        }
        true
    }

    /// The state of a row, if there is one.
    pub fn row(&self, row: usize) -> Option<Air> {
        let read = |column: &Vec<f64>| column.get(row).copied();
        let (t, w, p) = (read(&self.dry_bulb)?, read(&self.humidity_ratio)?, read(&self.pressure)?);
        restore(t, w, p, self.formulation).ok()
    }

    fn properties(&self, py: Python<'_>, quantities: &[Quantity]) -> PyResult<Vec<Vec<f64>>> {
        let mut columns =
            quantities.iter().map(|_| column::blank(self.status.len(), NAN)).collect::<PyResult<Vec<_>>>()?;
        let mut outputs: Vec<&mut [f64]> = columns.iter_mut().map(Vec::as_mut_slice).collect();
        self.write(py, quantities, &mut outputs)?;
        Ok(columns)
    }

    fn properties_into<'py>(
        &self,
        py: Python<'py>,
        names: &[Bound<'py, PyString>],
        quantities: &[Quantity],
        out: &Bound<'py, PyDict>,
    ) -> PyResult<()> {
        let mut targets =
            names.iter().map(|name| Target::read(out, name, &self.shape)).collect::<PyResult<Vec<_>>>()?;
        let mut outputs = targets.iter_mut().map(Target::memory).collect::<PyResult<Vec<_>>>()?;
        self.write(py, quantities, &mut outputs)?;
        targets.into_iter().try_for_each(|target| target.finish(py, &self.shape))
    }
}

/// Where a property is written to: an array of the caller, or memory of our own that is copied to it in the end.
enum Target<'py> {
    Direct(PyReadwriteArrayDyn<'py, f64>),
    Copied(Bound<'py, PyAny>, Vec<f64>),
}

impl<'py> Target<'py> {
    fn read(out: &Bound<'py, PyDict>, name: &Bound<'py, PyString>, shape: &[usize]) -> PyResult<Self> {
        let array = out.get_item(name)?.ok_or_else(|| PyValueError::new_err(format!("out has no array for {name}")))?;
        let untyped = array
            .cast::<numpy::PyUntypedArray>()
            .map_err(|_| PyTypeError::new_err(format!("out[{name:?}] must be a NumPy array")))?;
        if untyped.shape() != shape {
            return Err(PyValueError::new_err(format!(
                "shapes do not match: out[{name:?}] {:?}, states {shape:?}",
                untyped.shape()
            )));
        }
        match array.cast::<PyArrayDyn<f64>>() {
            Ok(typed) if typed.is_c_contiguous() && typed.is_aligned() => {
                Ok(Self::Direct(typed.try_readwrite().map_err(column::in_use)?))
            }
            _ => Ok(Self::Copied(array.clone(), column::blank(shape.iter().product(), NAN)?)),
        }
    }

    fn memory(&mut self) -> PyResult<&mut [f64]> {
        match self {
            Self::Direct(array) => Ok(array.as_slice_mut()?),
            Self::Copied(_, column) => Ok(column),
        }
    }

    fn finish(self, py: Python<'py>, shape: &[usize]) -> PyResult<()> {
        if let Self::Copied(array, column) = self {
            static COPY: PyOnceLock<Py<PyAny>> = PyOnceLock::new();
            let source = column::array(py, column, shape)?;
            COPY.import(py, "moistair._columns", "copy_to")?.call1((array, source))?;
        }
        Ok(())
    }
}

fn not_a_name(error: CastIntoError<'_>) -> PyErr {
    let got = error.into_inner();
    PyTypeError::new_err(format!(
        "names of properties are strings, one argument each, as properties('wet_bulb', 'dew_point'); not {}",
        got.get_type()
    ))
}

type Argument<'py> = (Quantity, Bound<'py, PyAny>);

/// The two properties that are given, the dry bulb first if it is one of them.
fn two_of<'py>(
    dry_bulb: Option<Bound<'py, PyAny>>,
    given: [Option<Bound<'py, PyAny>>; 16],
) -> PyResult<[Argument<'py>; 2]> {
    let dry_bulb = dry_bulb.map(|value| (Quantity::DryBulb, value));
    let given = SECOND.into_iter().zip(given).filter_map(|(quantity, value)| Some((quantity, value?)));
    let given: Vec<_> = dry_bulb.into_iter().chain(given).collect();
    let names = given.iter().map(|(quantity, _)| identifier(*quantity)).collect::<Vec<_>>().join(", ");
    <[Argument<'py>; 2]>::try_from(given).map_err(|_| {
        let all = SECOND.map(identifier).join(", ");
        PyTypeError::new_err(format!(
            "exactly two properties beside pressure fix a state, dry_bulb and one of {all}, or two of these; given: {names}"
        ))
    })
}

/// What fixes a state beside the pressure.
#[derive(Clone, Copy)]
struct Fixing {
    first: Quantity,
    second: Quantity,
    formulation: Formulation,
}

impl Fixing {
    fn air(&self, a: f64, b: f64, p: f64) -> Result<Air, Error> {
        let basis = Basis::new(Pressure::from_pascals(p), self.formulation);
        if self.first == Quantity::DryBulb {
            Air::from_dry_bulb_and(Temperature::from_celsius(a), self.second, b, basis)
        } else {
            Air::from_two_properties_and(self.first, a, self.second, b, basis)
        }
    }

    fn one(&self, py: Python<'_>, a: f64, b: f64, p: f64) -> PyResult<MoistAir> {
        match self.air(a, b, p) {
            Ok(air) => Ok(Content::One(air).into()),
            Err(error) => Err(exception(py, &error)),
        }
    }

    /// The states of rows. A pair that fixes no state is an error of the call, whatever is in the rows.
    fn many(&self, py: Python<'_>, shape: Vec<usize>, rows: usize, columns: [Column<'_>; 3]) -> PyResult<States> {
        if let Err(error @ Error::Undetermined { .. }) = self.air(NAN, NAN, NAN) {
            return Err(exception(py, &error));
        }
        let blank = || column::blank(rows, NAN);
        let mut states = States {
            formulation: self.formulation,
            shape,
            dry_bulb: blank()?,
            pressure: blank()?,
            humidity_ratio: blank()?,
            status: column::blank(rows, 0)?,
            failed: 0,
            settled: true,
        };
        py.detach(|| {
            let [a, b, p] = columns;
            for row in 0..rows {
                let at = |column: Column| column.get(row).unwrap_or(NAN);
                match self.air(at(a), at(b), at(p)) {
                    Ok(air) => states.set(row, &air),
                    Err(error) => states.fail(row, error.code()),
                }
            }
        });
        Ok(states)
    }
}

/// A state from the numbers of one that was made before, bit for bit.
pub fn restore(t: f64, w: f64, p: f64, formulation: Formulation) -> Result<Air, Error> {
    let basis = Basis::new(Pressure::from_pascals(p), formulation);
    Air::restore(Temperature::from_celsius(t), HumidityRatio::from_kilograms_per_kilogram(w), basis)
}

fn properties_of_one<'py>(
    py: Python<'py>,
    air: &Air,
    names: &[Bound<'py, PyString>],
    quantities: Vec<Quantity>,
) -> PyResult<Bound<'py, PyDict>> {
    let mut values = Vec::with_capacity(quantities.len());
    air.values(quantities, |_, value| values.push(value));
    let result = PyDict::new(py);
    for (name, value) in names.iter().zip(values) {
        result.set_item(name, value.map_err(|error| exception(py, &error))?)?;
    }
    Ok(result)
}

fn property_names<'py>(names: &Bound<'py, PyTuple>) -> PyResult<Vec<Bound<'py, PyString>>> {
    names.iter().map(|name| name.cast_into().map_err(not_a_name)).collect()
}

fn properties_named(py: Python<'_>, names: &[Bound<'_, PyString>]) -> PyResult<Vec<Quantity>> {
    let named =
        |name: &Bound<'_, PyString>| property_named(&name.to_cow()?).ok_or_else(|| no_property(py, &name.to_string()));
    names.iter().map(named).collect()
}

/// The property that an attribute names.
fn property_named(name: &str) -> Option<Quantity> {
    quantity_named(name).filter(|quantity| quantity.is_property())
}

/// The quantity of a name.
fn quantity_named(name: &str) -> Option<Quantity> {
    let same = |quantity: &&Quantity| {
        let words = quantity.name().bytes().map(|byte| if matches!(byte, b' ' | b'-') { b'_' } else { byte });
        words.eq(name.bytes())
    };
    Quantity::ALL.iter().find(same).copied()
}

/// The code of what covers the bulb, and the coefficient: of an aspirated instrument unless another is given.
fn psychrometer<'py>(
    py: Python<'py>,
    bulb: &str,
    coefficient: Option<Bound<'py, PyAny>>,
) -> PyResult<(Bound<'py, PyAny>, Bound<'py, PyAny>)> {
    let bulb = match bulb {
        "water" => Bulb::Water,
        "ice" => Bulb::Ice,
        _ => return Err(PyValueError::new_err(format!("bulb must be 'water' or 'ice', not {bulb:?}"))),
    };
    let aspirated = || number(py, Psychrometer::<f64>::aspirated(bulb).coefficient());
    Ok((number(py, bulb.code())?, coefficient.map_or_else(aspirated, Ok)?))
}

fn number(py: Python<'_>, value: impl Into<f64>) -> PyResult<Bound<'_, PyAny>> {
    Ok(value.into().into_pyobject(py)?.into_any())
}

/// Runs a process on a state, with one result.
fn only_result<'py, const N: usize>(
    py: Python<'py>,
    name: &str,
    layout: &str,
    arguments: [(&str, Bound<'py, PyAny>); N],
) -> PyResult<Bound<'py, PyAny>> {
    only_result_of(py, name, layout, arguments, Formulation::default())
}

fn only_result_of<'py, const N: usize>(
    py: Python<'py>,
    name: &str,
    layout: &str,
    arguments: [(&str, Bound<'py, PyAny>); N],
    formulation: Formulation,
) -> PyResult<Bound<'py, PyAny>> {
    let (labels, values): (Vec<_>, Vec<_>) = arguments.into_iter().unzip();
    let labels = PyList::new(py, labels)?.into_any();
    process::run(py, name, layout, labels, values, formulation.code())?.0.get_item(0)
}

/// The formulations of this build by their names.
const FORMULATIONS: &[(&str, Formulation)] = &[
    ("real_gas", Formulation::RealGas),
    ("ideal_gas", Formulation::IdealGas),
    #[cfg(feature = "helmholtz")]
    ("helmholtz", Formulation::Helmholtz),
];

pub fn formulation_named(name: &str) -> PyResult<Formulation> {
    let found = FORMULATIONS.iter().find(|(known, _)| *known == name);
    found.map(|(_, formulation)| *formulation).ok_or_else(|| {
        let names: Vec<_> = FORMULATIONS.iter().map(|(known, _)| format!("'{known}'")).collect();
        PyValueError::new_err(format!("formulation must be {}, not {name:?}", names.join(" or ")))
    })
}

fn formulation_name(formulation: Formulation) -> &'static str {
    FORMULATIONS.iter().find(|(_, known)| *known == formulation).map_or("", |(name, _)| name)
}

/// A state from what fixes it, for pickle.
#[pyfunction]
pub fn restore_state(
    py: Python<'_>,
    formulation: i32,
    shape: Vec<usize>,
    dry_bulb: Bound<'_, PyAny>,
    pressure: Bound<'_, PyAny>,
    humidity_ratio: Bound<'_, PyAny>,
    status: Bound<'_, PyAny>,
) -> PyResult<MoistAir> {
    let formulation =
        Formulation::from_code(formulation).ok_or_else(|| PyValueError::new_err("no such formulation"))?;
    if shape.is_empty() {
        let (t, w, p) = (dry_bulb.extract()?, humidity_ratio.extract()?, pressure.extract()?);
        let air = restore(t, w, p, formulation).map_err(|error| exception(py, &error))?;
        return Ok(Content::One(air).into());
    }
    let column = |value: Bound<'_, PyAny>| -> PyResult<Vec<f64>> { Ok(value.cast::<PyArray1<f64>>()?.to_vec()?) };
    let (dry_bulb, pressure, ratio) = (column(dry_bulb)?, column(pressure)?, column(humidity_ratio)?);
    let status = status.cast::<PyArray1<i32>>()?.to_vec()?;
    let rows = shape.iter().try_fold(1_usize, |rows, length| rows.checked_mul(*length));
    if [dry_bulb.len(), pressure.len(), ratio.len(), status.len()].iter().any(|length| Some(*length) != rows) {
        return Err(PyValueError::new_err("columns of a state differ in length"));
    }
    let failed = status.iter().filter(|code| **code != 0).count();
    Ok(Content::Many(States {
        formulation,
        shape,
        dry_bulb,
        pressure,
        humidity_ratio: ratio,
        status,
        failed,
        settled: false,
    })
    .into())
}

/// Every quantity as (name, code, unit, minimum, maximum, whether it is a property of a state).
#[pyfunction]
pub fn quantity_table() -> Vec<(String, i32, &'static str, f64, f64, bool)> {
    let row = |quantity: &Quantity| {
        let (minimum, maximum) = quantity.limits();
        (identifier(*quantity), quantity.code(), quantity.unit(), minimum, maximum, quantity.is_property())
    };
    Quantity::ALL.iter().map(row).collect()
}

/// The range that an input may have with a formulation, in the unit of `QUANTITIES`.
///
/// Parameters
/// ----------
/// quantity : str
///     Name of a quantity, as in `QUANTITIES`.
/// formulation : {'real_gas', 'ideal_gas', 'helmholtz'}
///     The Helmholtz formulation reaches 200 °C and 5 MPa.
///
/// Returns
/// -------
/// tuple of float
///     Least and greatest value, both allowed.
///
/// Raises
/// ------
/// UnknownNameError
///     A name that is no quantity.
/// ValueError
///     An unknown formulation.
///
/// Examples
/// --------
/// >>> import moistair
/// >>> moistair.limits("pressure"), moistair.limits("pressure", "helmholtz")
/// ((20000.0, 1100000.0), (20000.0, 5000000.0))
#[pyfunction]
#[pyo3(signature = (quantity, formulation="real_gas"))]
pub fn limits(py: Python<'_>, quantity: &str, formulation: &str) -> PyResult<(f64, f64)> {
    let formulation = formulation_named(formulation)?;
    let quantity = quantity_named(quantity)
        .ok_or_else(|| unknown_name(py, format!("{quantity} is no quantity; moistair.QUANTITIES lists them")))?;
    Ok(formulation.limits(quantity))
}
