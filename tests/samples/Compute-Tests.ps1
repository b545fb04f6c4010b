# One test by PowerShell: ./Compute-Tests.ps1 http://localhost:5000
param([Parameter(Mandatory)] [string] $Service)

$test = @{
    reference = 'Ternmarsh, pit 2'
    specimens = @(
        @{ waterContent = 10; dryDensity = 1.75 }, @{ waterContent = 12; dryDensity = 1.82 }, @{ waterContent = 14; dryDensity = 1.86 },
        @{ waterContent = 16; dryDensity = 1.83 }, @{ waterContent = 18; dryDensity = 1.77 }
    )
}
$answer = Invoke-RestMethod "$Service/v1/moisture-density" -Method Post -ContentType 'application/json' -Body ($test | ConvertTo-Json -Depth 5)
'{0}: {1} at {2}' -f $answer.reference, $answer.optimum.reported.maximumDryDensity, $answer.optimum.reported.waterContent
