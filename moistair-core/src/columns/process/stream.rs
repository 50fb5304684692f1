//! Air in motion, with and without condensate, and water.

use super::row::{Argument, Outcome, Row, RowError, Walk, answers, choices, processes};
use crate::process::{AirStream, Exchange, WetStream};
use crate::{
    AirWithCondensate, Basis, Density, Freezing, HeatFlow, HumidityRatio, MassFlow, MoistAir, SpecificEnthalpy,
    Temperature, VolumeFlow, liquid_water_enthalpy,
};

processes! {
    200 "stream": (air: MoistAir, dry_air_flow: MassFlow) -> AirStream { AirStream::new(air, dry_air_flow)? }
    201 "stream.from_volume_flow": (air: MoistAir, volume_flow: VolumeFlow) -> AirStream {
        AirStream::from_volume_flow(air, volume_flow)?
    }
    202 "stream.from_standard_volume_flow": (air: MoistAir, volume_flow: VolumeFlow, reference_density: Density) -> AirStream {
        AirStream::from_standard_volume_flow(air, volume_flow, reference_density)?
    }
    203 "wet_stream": (air: AirWithCondensate, dry_air_flow: MassFlow) -> WetStream { WetStream::new(air, dry_air_flow)? }
    204 "wet_air": (air: MoistAir, liquid: HumidityRatio, ice: HumidityRatio) -> AirWithCondensate {
        AirWithCondensate::new(air, liquid, ice)?
    }
    205 "wet_air.from_enthalpy_and_water":
        (specific_enthalpy: SpecificEnthalpy, total_water: HumidityRatio, freezing: Freezing, pressure: Basis) -> AirWithCondensate {
        AirWithCondensate::from_enthalpy_and_water(specific_enthalpy, total_water, freezing, pressure)?
    }
    206 "wet_air.from_dry_bulb_and_water":
        (dry_bulb: Temperature, total_water: HumidityRatio, freezing: Freezing, pressure: Basis) -> AirWithCondensate {
        AirWithCondensate::from_dry_bulb_and_water(dry_bulb, total_water, freezing, pressure)?
    }
    207 "liquid_water_enthalpy": (water_temperature: Temperature, pressure: Basis) -> "specific_enthalpy" SpecificEnthalpy {
        liquid_water_enthalpy(water_temperature, pressure)?
    }
}

choices! {
    Freezing { 0 "equilibrium" => Equilibrium, 1 "supercooled" => Supercooled }
}

answers! {
    AirStream, |x| { air: x.air(), dry_air_flow: x.dry_air_flow(), volume_flow: x.volume_flow() }
    AirWithCondensate, |x| {
        air: x.air(),
        liquid: x.liquid(),
        ice: x.ice(),
        total_water: x.total_water(),
        specific_enthalpy: x.specific_enthalpy(),
        is_wet: x.is_wet(),
    }
    WetStream, |x| { air: x.air(), dry_air_flow: x.dry_air_flow() }
    Exchange, |x| { heat: x.heat, water: x.water, water_enthalpy_flow: x.water_enthalpy_flow }
}

/// The arguments that are made, and checked, from others.
macro_rules! made {
    ($($type:ident { $($part:ident: $of:ty),+ } $make:expr;)*) => {$(
        impl Argument for $type {
            fn describe(walk: &mut Walk<'_>, name: &'static str) {
                walk.within(name, |walk| { $(<$of as Argument>::describe(walk, stringify!($part));)+ });
            }

            fn read(row: &mut Row<'_>) -> Outcome<Self> {
                $(let $part = <$of as Argument>::read(row)?;)+
                Ok($make)
            }
        }
    )*};
}
made! {
    AirStream { air: MoistAir, dry_air_flow: MassFlow } Self::new(air, dry_air_flow)?;
    WetStream { air: AirWithCondensate, dry_air_flow: MassFlow } Self::new(air, dry_air_flow)?;
    AirWithCondensate { air: MoistAir, liquid: HumidityRatio, ice: HumidityRatio } Self::new(air, liquid, ice)?;
    Exchange { heat: HeatFlow, water: MassFlow, water_enthalpy_flow: HeatFlow } Self { heat, water, water_enthalpy_flow };
}

/// The most streams of one row.
pub const MAX_STREAMS: usize = 32;

/// Everything that is left of a row, as streams.
pub(super) struct Streams(Option<([WetStream; MAX_STREAMS], usize)>);

impl Streams {
    pub fn as_slice(&self) -> &[WetStream] {
        self.0.as_ref().and_then(|(streams, count)| streams.get(..*count)).unwrap_or_default()
    }
}

impl Argument for Streams {
    fn describe(walk: &mut Walk<'_>, name: &'static str) {
        walk.group(|walk| WetStream::describe(walk, name));
    }

    fn read(row: &mut Row<'_>) -> Outcome<Self> {
        if row.is_finished() {
            return Ok(Self(None));
        }
        let (mut streams, mut count) = ([WetStream::read(row)?; MAX_STREAMS], 1);
        while !row.is_finished() {
            *streams.get_mut(count).ok_or(RowError::Misfit)? = WetStream::read(row)?;
            count += 1;
        }
        Ok(Self(Some((streams, count))))
    }
}
