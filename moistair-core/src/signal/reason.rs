//! How far a sample can be trusted, and why.

use super::coded::coded_enum;

coded_enum! {
    /// How far a sample can be trusted. The order is the order of severity.
    ///
    /// It is what OPC UA (OPC 10000-4) calls the severity of a status: good, uncertain, bad.
    Quality {
        /// The reading as it came, converted to the unit of the core.
        Good = 0, "good";
        /// A usable value that is not quite the reading: clipped to saturation, or the last good value held.
        Repaired = 1, "repaired";
        /// No value.
        Refused = 2, "refused";
    }
}

impl Quality {
    /// The quality of a result that depends on both: the worse of the two.
    ///
    /// ```
    /// use moistair_core::signal::Quality;
    /// assert_eq!(Quality::Good.worst(Quality::Repaired), Quality::Repaired);
    /// ```
    #[must_use]
    pub const fn worst(self, other: Self) -> Self {
        if self.code() >= other.code() { self } else { other }
    }
}

coded_enum! {
    /// Why a sample has the quality that it has.
    ///
    /// The reasons that begin with `LooksLike` are a hint about the wiring or the configuration: the sample is refused,
    /// never converted on a guess.
    Reason {
        /// Nothing to remark.
        Ok = 0, "in order";
        /// No reading: NaN.
        Missing = 1, "missing";
        /// Below the lowest value that the channel allows.
        BelowRange = 2, "below the range of the channel";
        /// Above the highest value that the channel allows, for a relative humidity above
        /// [`HIGHEST_RELATIVE_HUMIDITY`](super::HIGHEST_RELATIVE_HUMIDITY).
        AboveRange = 3, "above the range of the channel";
        /// A relative humidity slightly above one, taken as exactly one.
        AboveSaturation = 4, "slightly above saturation, taken as saturated";
        /// Unchanged for longer than a living signal would be.
        Stuck = 5, "stuck";
        /// A good reading after a pause: nothing may be integrated across the pause. A total judges that once more, by
        /// the longest step that it bridges.
        Gap = 6, "first reading after a gap";
        /// The time is not later than the time before.
        TimeNotIncreasing = 7, "time not increasing";
        /// The time is no number or beyond [`LONGEST_TIME`](super::LONGEST_TIME).
        TimeInvalid = 8, "time is not a valid number of seconds";
        /// Refused, and filled with the last good value; [`Checked::cause`](super::Checked::cause) keeps what was wrong.
        Held = 9, "last good value held";
        /// The channel itself makes no sense: limits the wrong way round, a unit of another quantity.
        ChannelInvalid = 10, "channel is not valid";
        /// In degrees Celsius the reading would be in range.
        LooksLikeCelsius = 11, "looks like degrees celsius";
        /// In degrees Fahrenheit the reading would be in range.
        LooksLikeFahrenheit = 12, "looks like degrees fahrenheit";
        /// In kelvin the reading would be in range.
        LooksLikeKelvin = 13, "looks like kelvin";
        /// A channel in percent that delivers fractions.
        LooksLikeFraction = 14, "looks like a fraction";
        /// A channel in fractions that delivers percent.
        LooksLikePercent = 15, "looks like percent";
        /// In pascal the reading would be in range.
        LooksLikePascal = 16, "looks like pascal";
        /// In hectopascal (millibar) the reading would be in range.
        LooksLikeHectopascal = 17, "looks like hectopascal";
        /// In kilopascal the reading would be in range.
        LooksLikeKilopascal = 18, "looks like kilopascal";
        /// In bar the reading would be in range.
        LooksLikeBar = 19, "looks like bar";
        /// In pounds per square inch the reading would be in range.
        LooksLikePoundPerSquareInch = 20, "looks like pounds per square inch";
        /// In inches of mercury the reading would be in range.
        LooksLikeInchOfMercury = 21, "looks like inches of mercury";
        /// In a unit without a reason of its own, or in each of several units, the reading would be in range.
        LooksLikeOtherUnit = 22, "looks like another unit";
    }
}
