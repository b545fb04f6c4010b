using Drypeak.Soil.Quantities;

namespace Drypeak.Soil.Earthwork;

/// <summary>Trucks that run between one loader and the fill.</summary>
/// <param name="LoadingSeconds">To load one truck, over 0.</param>
/// <param name="DumpSeconds">To turn and dump.</param>
/// <param name="HaulSpeed">Loaded.</param>
/// <param name="ReturnSpeed">Empty.</param>
/// <param name="Trucks">How many; null for as many as balance the loader.</param>
/// <param name="Efficiency">Share of the hour that is worked, over 0 up to 1.</param>
public sealed record Fleet(double LoadingSeconds, double DumpSeconds, Speed HaulSpeed, Speed ReturnSpeed, int? Trucks, double Efficiency)
{
    /// <summary>One round of a truck over a distance.</summary>
    public FleetCycle Over(Length distance) => new(this, distance);
}

/// <summary>One round of a truck: load, haul, dump, return.</summary>
/// <param name="Fleet">The fleet.</param>
/// <param name="Distance">From loader to fill.</param>
public sealed record FleetCycle(Fleet Fleet, Length Distance)
{
    private const double Arithmetic = 1e-9;

    /// <summary>Loaded, s.</summary>
    public double HaulSeconds => Distance.Meters / Fleet.HaulSpeed.MetersPerSecond;

    /// <summary>Empty, s.</summary>
    public double ReturnSeconds => Distance.Meters / Fleet.ReturnSpeed.MetersPerSecond;

    /// <summary>All of the round, s.</summary>
    public double Seconds => Fleet.LoadingSeconds + HaulSeconds + Fleet.DumpSeconds + ReturnSeconds;

    /// <summary>Rounds of loading that fit into a round of a truck: with so many trucks neither loader nor truck waits.</summary>
    public double BalancedTrucks => Seconds / Fleet.LoadingSeconds;

    /// <summary>Whole trucks that keep the loader at work.</summary>
    public double TrucksToBalance => Count.RoundedUp(BalancedTrucks);

    /// <summary>Trucks that run.</summary>
    public double Trucks => Fleet.Trucks ?? TrucksToBalance;

    /// <summary>Who waits for the other.</summary>
    public FleetWait Waits => Trucks < BalancedTrucks * (1 - Arithmetic) ? FleetWait.Loader : Trucks > BalancedTrucks * (1 + Arithmetic) ? FleetWait.Trucks : FleetWait.None;

    /// <summary>Loads in an hour: as many as the trucks bring round, and no more than the loader fills.</summary>
    public double LoadsPerHour => 3600 * Fleet.Efficiency * Math.Min(1 / Fleet.LoadingSeconds, Trucks / Seconds);
}

/// <summary>Who stands idle in a fleet.</summary>
public enum FleetWait
{
    /// <summary>Nobody: the trucks balance the loader.</summary>
    None,
    /// <summary>The loader, for trucks.</summary>
    Loader,
    /// <summary>The trucks, for the loader.</summary>
    Trucks,
}
