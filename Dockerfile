# Two stages: the SDK builds, the runtime runs. The image has no compiler, no root and no file of its own to write.
FROM mcr.microsoft.com/dotnet/sdk:10.0 AS build
WORKDIR /source

# Project files first: packages are restored again only when they change.
COPY global.json Directory.Build.props Directory.Packages.props .editorconfig ./
COPY src/Drypeak.Soil/*.csproj src/Drypeak.Soil/packages.lock.json src/Drypeak.Soil/
COPY src/Drypeak.Figures/*.csproj src/Drypeak.Figures/packages.lock.json src/Drypeak.Figures/
COPY src/Drypeak.Service/*.csproj src/Drypeak.Service/packages.lock.json src/Drypeak.Service/
RUN dotnet restore src/Drypeak.Service --locked-mode

COPY src/ src/
ARG TARGETARCH=amd64
RUN dotnet publish src/Drypeak.Service --no-restore -c Release -a $TARGETARCH --self-contained false -o /app

FROM mcr.microsoft.com/dotnet/aspnet:10.0
WORKDIR /app
COPY --from=build /app .
# The runtime's diagnostics would open a socket in the temp folder; without them the file system can be read-only.
# Beyond its own network the service listens only with keys, or with Access__AllowOpen=true where something guards it (deploy/README.md):
#   docker run --read-only -e Access__AllowOpen=true -p 127.0.0.1:8080:8080 drypeak
ENV DOTNET_EnableDiagnostics=0 \
    ASPNETCORE_URLS=http://0.0.0.0:8080
EXPOSE 8080
USER $APP_UID
ENTRYPOINT ["dotnet", "Drypeak.Service.dll"]
