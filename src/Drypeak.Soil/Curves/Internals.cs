using System.Runtime.CompilerServices;

// The kernels are checked by themselves: against published data sets, and piece by piece against the definition.
[assembly: InternalsVisibleTo("Drypeak.Soil.Tests")]
