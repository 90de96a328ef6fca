namespace LoadWatch.People;

/// <summary>By which published line a maximal heart rate is estimated from age.</summary>
public enum HeartRateMaxEquation
{
    /// <summary>208 - 0.7 age. Tanaka, Monahan and Seals 2001, Age-predicted maximal heart rate revisited, J Am Coll Cardiol 37:153-156.</summary>
    Tanaka,

    /// <summary>211 - 0.64 age. Nes et al. 2013, Age-predicted maximal heart rate in healthy subjects: The HUNT Fitness Study, Scand J Med Sci Sports
    /// 23:697-704.</summary>
    Nes,

    /// <summary>207 - 0.7 age. Gellish et al. 2007, Longitudinal modeling of the relationship between age and maximal heart rate, Med Sci Sports Exerc
    /// 39:822-829 (equation from memory).</summary>
    Gellish,

    /// <summary>206 - 0.88 age, of women only; of others by Tanaka. Gulati et al. 2010, Heart rate response to exercise stress testing in asymptomatic women:
    /// The St. James Women Take Heart Project, Circulation 122:130-137.</summary>
    Gulati,

    /// <summary>220 - 0.95 age of men, 210 - 0.79 age of women, the mean where sex is not stated. Sydó et al. 2014, Relationship between exercise heart rate and age in men
    /// vs women, Mayo Clin Proc.</summary>
    Sydo,
}
